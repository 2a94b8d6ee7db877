const teeth = [18, 9, 9, 9, 13, 9, 9, 18];

/** The comb whose eight teeth are a measuring rule; the last one is apricot. */
export function CombMark({ className = 'h-6.5 w-10' }: { className?: string }) {
  return (
    <svg viewBox="0 0 40 26" className={className} aria-hidden="true">
      <rect x="1" y="1" width="38" height="7" rx="3.5" fill="var(--collar)" />
      {teeth.map((length, index) => (
        <rect
          key={index}
          x={3 + index * 4.6}
          y="7"
          width="2.6"
          height={length}
          rx="1.3"
          fill={index === teeth.length - 1 ? 'var(--apricot)' : 'var(--collar)'}
        />
      ))}
    </svg>
  );
}
