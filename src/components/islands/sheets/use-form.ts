import { useEffect, useRef, useState, type SyntheticEvent } from 'react';
import { ApiProblem } from '@/components/islands/api';
import type { FieldProblem } from '@/components/ui/ErrorSummary';
import { afterPointer, watchPointer } from '@/components/ui/pointer';
import { only, without, type Checked, type Problems } from './checked';
import { useErrorTitle, useLeaveGuard } from './use-page';

export interface FormOptions<Values, Body, Answer> {
  readonly initial: Values;
  /** Comes before the name of each field in its id, so that two forms can stand on one page. */
  readonly prefix: string;
  readonly check: (values: Values) => Checked<Body>;
  readonly send: (body: Body) => Promise<Answer>;
  readonly onSent: (answer: Answer) => void;
  /** Somebody saved another version in the meantime; without it that is told like any other refusal. */
  readonly onLostRace?: (current: unknown, body: Body) => void;
}

export interface Form<Values> {
  readonly prefix: string;
  readonly values: Values;
  readonly problems: Problems;
  readonly summary: readonly FieldProblem[];
  readonly busy: boolean;
  readonly signedOut: boolean;
  /** Takes what was typed; problems of these fields are looked at again where they show, or everywhere with `settled`. */
  readonly change: (next: Partial<Values>, settled?: boolean) => void;
  /** A number that cannot be read, told by its field; null when it is mended. */
  readonly fault: (field: string, sentence: string | null) => void;
  readonly submit: (event?: SyntheticEvent) => void;
}

const LOST_RACE = 412;
const NOT_SIGNED_IN = 401;

/** What every form here does: keep what is typed, check it by the contract, send it, and say what is wrong in one list. */
export function useForm<Values extends object, Body, Answer>(options: FormOptions<Values, Body, Answer>): Form<Values> {
  const { initial, prefix, check } = options;
  const [values, setValues] = useState(initial);
  const [problems, setProblems] = useState<Problems>({});
  const [faults, setFaults] = useState<Problems>({});
  const [summary, setSummary] = useState<readonly FieldProblem[]>([]);
  const [busy, setBusy] = useState(false);
  const [signedOut, setSignedOut] = useState(false);
  const sent = useRef(false);
  useEffect(watchPointer, []);
  useErrorTitle(summary.length > 0);
  useLeaveGuard(values !== initial, sent);

  const change = (next: Partial<Values>, settled = false) => {
    const after = { ...values, ...next };
    const names = Object.keys(next);
    const checked = check(after);
    const found = checked.ok ? {} : only(checked.problems, names);
    const shown = settled ? found : Object.fromEntries(Object.entries(found).filter(([field]) => field in problems));
    setValues(after);
    afterPointer(() => setProblems((now) => ({ ...without(now, names), ...shown })));
  };

  // the field itself shows its fault; here it is kept for the list of what is wrong
  const fault = (field: string, sentence: string | null) => {
    setFaults((now) => (sentence === null ? without(now, [field]) : { ...now, [field]: sentence }));
    if (sentence === null) afterPointer(() => setProblems((now) => without(now, [field])));
  };

  const refuse = (found: Problems, whole: string | null = null) => {
    setProblems(found);
    const lines = inOrderOfPage(prefix, found).map(([field, message]) => ({ field: prefix + field, message }));
    setSummary(lines.length > 0 || whole === null ? lines : [{ field: null, message: whole }]);
  };

  const refused = (error: unknown, body: Body) => {
    if (!(error instanceof ApiProblem)) throw error;
    if (error.status === LOST_RACE && options.onLostRace) return options.onLostRace(error.document.current, body);
    setSignedOut(error.status === NOT_SIGNED_IN);
    refuse(error.fields, error.detail);
  };

  const submit = async (event?: SyntheticEvent) => {
    event?.preventDefault();
    if (busy) return;
    const checked = check(values);
    const wrong = { ...(checked.ok ? {} : checked.problems), ...faults };
    if (!checked.ok || Object.keys(faults).length > 0) return refuse(wrong);
    refuse({});
    setBusy(true);
    try {
      const answer = await options.send(checked.body);
      sent.current = true;
      options.onSent(answer);
    } catch (error) {
      setBusy(false);
      refused(error, checked.body);
    }
  };

  return {
    prefix,
    values,
    problems,
    summary,
    busy,
    signedOut,
    change,
    fault,
    submit: (event) => void submit(event),
  };
}

/** Problems as a person meets their fields from top to bottom. */
function inOrderOfPage(prefix: string, problems: Problems): (readonly [string, string])[] {
  const place = (field: string) => document.getElementById(prefix + field);
  return Object.entries(problems).sort(([a], [b]) => {
    const [first, second] = [place(a), place(b)];
    if (!first || !second) return first ? -1 : second ? 1 : 0;
    return first.compareDocumentPosition(second) & Node.DOCUMENT_POSITION_FOLLOWING ? -1 : 1;
  });
}
