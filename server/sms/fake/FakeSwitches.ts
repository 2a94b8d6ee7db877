/** How the fake misbehaves, for tests: change it at any moment. */
export interface FakeSwitches {
  /** 'acceptThenDrop' keeps the message but never answers. */
  mode: 'fine' | 'down' | 'slow' | 'throttled' | 'acceptThenDrop';
  slowMs: number;
  callbacks: 'inOrder' | 'duplicate' | 'reversed';
}
