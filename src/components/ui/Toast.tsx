import { useCallback, useState, type ReactNode } from 'react';

export interface ToastMessage {
  readonly id: number;
  readonly text: string;
  readonly action?: { readonly label: string; readonly onPress: () => void };
}

/** What has just been done, with a way back. A message stays until it is closed or replaced by the fourth after it. */
export function useToasts(): {
  toasts: readonly ToastMessage[];
  show: (text: string, action?: ToastMessage['action']) => void;
  close: (id: number) => void;
} {
  const [toasts, setToasts] = useState<readonly ToastMessage[]>([]);
  const show = useCallback((text: string, action?: ToastMessage['action']) => {
    setToasts((now) => [...now.slice(-2), { id: (now.at(-1)?.id ?? 0) + 1, text, ...(action && { action }) }]);
  }, []);
  const close = useCallback((id: number) => setToasts((now) => now.filter((toast) => toast.id !== id)), []);
  return { toasts, show, close };
}

/** The corner where toasts appear; always in the page, so that a screen reader hears each. */
export const Toasts = ({ toasts, onClose }: { toasts: readonly ToastMessage[]; onClose: (id: number) => void }) => (
  <div className="toasts" role="status" aria-live="polite">
    {toasts.map((toast) => (
      <div key={toast.id} className="toast">
        <span>{toast.text}</span>
        {toast.action && (
          <button
            type="button"
            className="underline"
            onClick={() => {
              toast.action?.onPress();
              onClose(toast.id);
            }}
          >
            {toast.action.label}
          </button>
        )}
        <button type="button" aria-label="Close" className="ml-auto px-1" onClick={() => onClose(toast.id)}>
          ×
        </button>
      </div>
    ))}
  </div>
);

/** A short line that says how things stand ("saved 12:04"); changes are spoken without moving focus. */
export const Status = ({ children, className }: { children: ReactNode; className?: string }) => (
  <span role="status" aria-live="polite" aria-atomic="true" className={className ?? 'muted'}>
    {children}
  </span>
);
