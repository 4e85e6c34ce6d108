import { useEffect, useRef } from 'react';

export interface FieldProblem {
  /** The id of the field, or its name where the field carries no id. */
  readonly field: string | null;
  readonly message: string;
}

export interface ErrorSummaryProps {
  problems: readonly FieldProblem[];
  title?: string;
  /** Counts the tries, so that focus comes here again when a second try fails in the same way. */
  attempt?: number;
}

/** All that is wrong with a form, above it: focus goes here, each line leads to its field, in the words beside the field. */
export function ErrorSummary({ problems, title = 'There is a problem', attempt = 0 }: ErrorSummaryProps) {
  const box = useRef<HTMLDivElement>(null);
  const text = problems.map(({ message }) => message).join('\n');
  useEffect(() => {
    if (text !== '') box.current?.focus();
  }, [text, attempt]);
  if (problems.length === 0) return null;
  return (
    <div ref={box} tabIndex={-1} role="alert" className="notice notice-attention mb-4">
      <h2>{title}</h2>
      <ul className="mt-1">
        {problems.map(({ field, message }) => (
          <li key={`${field}${message}`}>
            {field === null ? (
              message
            ) : (
              <a href={`#${field}`} onClick={(event) => focusField(event, field)}>
                {message}
              </a>
            )}
          </li>
        ))}
      </ul>
    </div>
  );
}

function focusField(event: { preventDefault: () => void }, field: string) {
  const target = document.getElementById(field) ?? document.querySelector<HTMLElement>(`[name="${CSS.escape(field)}"]`);
  if (!target) return;
  event.preventDefault();
  target.focus();
}
