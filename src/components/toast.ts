export interface ToastNote {
  id: number;
  words: string;
  tone: 'ok' | 'bad';
}

let notes: ToastNote[] = [];
let nextId = 1;
const listeners = new Set<() => void>();

/** Says something happened, at the foot of the screen, for six seconds. */
export function toast(words: string, tone: ToastNote['tone'] = 'ok'): void {
  const note = { id: nextId++, words, tone };
  notes = [...notes.slice(-2), note];
  tell();
  setTimeout(() => dismissToast(note.id), 6000);
}

export function dismissToast(id: number): void {
  notes = notes.filter((note) => note.id !== id);
  tell();
}

export function readToasts(): ToastNote[] {
  return notes;
}

export function subscribeToasts(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

function tell(): void {
  for (const listener of listeners) listener();
}
