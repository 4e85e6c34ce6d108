import type { ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import type { Form } from './use-form';
import { useAwake } from './use-page';

interface Props {
  form: Pick<Form<object>, 'summary' | 'busy' | 'signedOut' | 'submit'>;
  /** Names the form for a screen reader. */
  label: string;
  /** What the first button does. */
  action: string;
  onCancel?: () => void;
  /** Further buttons, after the first. */
  more?: ReactNode;
  children: ReactNode;
}

/** The list of what is wrong, the fields, and the buttons of a form. */
export function FormFrame({ form, label, action, onCancel, more, children }: Props) {
  const awake = useAwake();
  return (
    <form onSubmit={form.submit} noValidate aria-label={label}>
      <ErrorSummary problems={form.summary} />
      {form.signedOut && <SignInAgain />}
      {/* what is typed before the page is awake would be lost */}
      <fieldset disabled={!awake} className="min-w-0">
        {children}
        <div className="mt-4 flex flex-wrap items-center gap-2">
          <Button type="submit" variant="primary" isPending={form.busy}>
            {action}
          </Button>
          {more}
          {onCancel && (
            <Button variant="quiet" onPress={onCancel}>
              Cancel
            </Button>
          )}
        </div>
      </fieldset>
    </form>
  );
}

/** The way back in that leaves this page, and what is typed on it, as it is. */
export const SignInAgain = () => (
  <p className="mb-4">
    <a href="/sign-in" target="_blank" rel="noopener">
      Sign in in another tab
    </a>
    , then come back and send this again.
  </p>
);
