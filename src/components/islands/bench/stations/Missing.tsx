/** What a station still misses, as sentences; a quiet word of readiness when it misses nothing. */
export function Missing({ sentences, ready }: { sentences: readonly string[]; ready: string }) {
  if (sentences.length === 0) return <p className="muted">{ready}</p>;
  return (
    <div className="notice">
      <p className="font-semibold">Still to do</p>
      <ul className="mt-1 list-disc pl-4">
        {sentences.map((sentence) => (
          <li key={sentence}>{sentence}</li>
        ))}
      </ul>
    </div>
  );
}
