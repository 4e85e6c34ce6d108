import type { ReactNode } from 'react';

/** Nothing here yet, and what to do next. */
export const EmptyState = ({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) => (
  <div className="empty">
    <h2>{title}</h2>
    {children && <p className="mt-1">{children}</p>}
    {action && <div className="mt-3">{action}</div>}
  </div>
);
