export type ButtonKind = 'go' | 'plain' | 'quiet' | 'danger';
export type ButtonSize = 'usual' | 'small' | 'big';

/** Classes shared by buttons and links that look like buttons. */
export function buttonLook(kind: ButtonKind = 'plain', size: ButtonSize = 'usual'): string {
  return `${base} ${sizes[size]} ${kinds[kind]}`;
}

const base =
  'inline-flex items-center justify-center gap-2 text-center leading-tight font-semibold ' +
  'border select-none transition-colors disabled:opacity-55 disabled:cursor-not-allowed ' +
  'aria-disabled:opacity-55';

const sizes: Record<ButtonSize, string> = {
  usual: 'min-h-11 md:min-h-10.5 px-4 py-2 rounded-[10px] text-[15px]',
  small: 'min-h-11 md:min-h-9 px-3 py-1.5 rounded-[9px] text-sm',
  big: 'min-h-14 px-5 py-3 rounded-card text-lg w-full',
};

const kinds: Record<ButtonKind, string> = {
  go: 'bg-collar text-white border-collar hover:bg-[#0f413c]',
  plain: 'bg-white text-ink border-fawn hover:bg-linen',
  quiet: 'bg-transparent text-collar border-transparent hover:bg-linen',
  danger: 'bg-white text-rosette border-rosette hover:bg-rosette-soft',
};
