import { useEffect, useState } from 'react';

/** Searches while typing, after a short pause. */
export function SearchBox({
  label,
  value,
  onSearch,
  placeholder,
  className = '',
}: {
  label: string;
  value: string;
  onSearch: (text: string) => void;
  placeholder?: string;
  className?: string;
}) {
  const [typed, setTyped] = useState(value);
  useEffect(() => {
    if (typed === value) return;
    const timer = setTimeout(() => onSearch(typed), 250);
    return () => clearTimeout(timer);
  }, [typed, value, onSearch]);
  return (
    <input
      type="search"
      aria-label={label}
      placeholder={placeholder ?? label}
      value={typed}
      onChange={(event) => setTyped(event.target.value)}
      className={`entry ${className}`}
    />
  );
}
