import type { ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import type { Station } from '@/lib/editor';
import { useTools } from '../state/tools';

export interface StationHeadProps {
  readonly title: string;
  readonly next: Station;
  /** What the way on says: "Go on to the frame". */
  readonly onward: string;
  readonly children?: ReactNode;
}

/** The head of a station with the one way on. It stands above everything that comes and goes, so that it never moves from under a press. */
export function StationHead({ title, next, onward, children }: StationHeadProps) {
  const { store } = useTools();
  return (
    <div className="bench-head">
      <h2>{title}</h2>
      {children}
      <Button variant="primary" className="ml-auto" onPress={() => store.go({ type: 'station', station: next })}>
        {onward}
      </Button>
    </div>
  );
}
