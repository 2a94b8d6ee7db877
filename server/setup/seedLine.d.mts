export interface SignIn {
  role: string;
  email: string;
  password: string;
}
export function seedLine(
  line: string,
): { progress: string } | { signIns: SignIn[] } | { text: string };
