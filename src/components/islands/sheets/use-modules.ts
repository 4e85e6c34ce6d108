import { useState } from 'react';
import { api, ApiProblem } from '@/components/islands/api';
import { partName } from '@/components/sheets/words';
import type { ModuleView, VendorModule } from '@/lib/contracts';
import { focusSoon } from './use-page';

/** The form that stands open: one to add, beginning from another module or from nothing, or one to edit. */
export type OpenForm =
  { readonly is: 'add'; readonly like: ModuleView | null; readonly key: number } | { readonly is: 'edit'; readonly id: number } | null;

export const ADD_BUTTON = 'add-module';
export const editButton = (id: number): string => `edit-${id}`;

/** Asks for a reading and goes to its bench; answers a sentence when it could not be started. */
async function startReading(sheetId: number, moduleId: number): Promise<string> {
  try {
    const { id } = await api.post<{ id: number }>(`/api/sheets/${sheetId}/readings`, { moduleId });
    location.assign(`/bench/${id}`);
    return '';
  } catch (error) {
    if (error instanceof ApiProblem) return error.detail;
    throw error;
  }
}

/** The modules of a sheet's vendor, the form that is open, and what was last said. */
export function useModules(sheetId: number, first: readonly VendorModule[]) {
  const [modules, setModules] = useState(first);
  const [open, setOpen] = useState<OpenForm>(null);
  const [said, setSaid] = useState('');
  const [refusal, setRefusal] = useState('');

  const close = (focus: string, sentence = '') => {
    setOpen(null);
    setSaid(sentence);
    focusSoon(focus);
  };
  const start = async (moduleId: number) => setRefusal(await startReading(sheetId, moduleId));
  return {
    modules,
    open,
    said,
    refusal,
    start,
    openAdd: (like: ModuleView | null = null) => setOpen((now) => ({ is: 'add', like, key: now?.is === 'add' ? now.key + 1 : 1 })),
    openEdit: (id: number) => setOpen({ is: 'edit', id }),
    cancelAdd: () => close(ADD_BUTTON),
    added: (module: ModuleView, andStart: boolean) => {
      setModules((now) => [...now, { ...module, approved: false, mayEdit: true }]);
      close(ADD_BUTTON, `${partName(module)} is added.`);
      if (andStart) void start(module.id);
    },
    edited: (after: ModuleView, sentence: string) => {
      setModules((now) => now.map((module) => (module.id === after.id ? { ...module, ...after } : module)));
      close(editButton(after.id), sentence);
    },
  };
}
