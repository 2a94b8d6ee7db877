/** Said where a person may look but not change. */
export function ReadOnlyNote() {
  return <p className="mb-4 text-slate">Only an operator changes this. You see it as it is.</p>;
}
