import type { ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import type { Station } from '@/lib/editor';
import { useTools } from '../state/tools';

/** The one way on from a station. */
export function NextStation({ station, children }: { station: Station; children: ReactNode }) {
  const { store } = useTools();
  return (
    <Button variant="primary" onPress={() => store.go({ type: 'station', station })}>
      {children}
    </Button>
  );
}
