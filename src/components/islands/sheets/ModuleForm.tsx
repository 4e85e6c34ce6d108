import { useRef, useState, type SyntheticEvent } from 'react';
import { api, ask } from '@/components/islands/api';
import { Button } from '@/components/ui/Button';
import type { ModuleBody, ModuleView } from '@/lib/contracts';
import { differences } from './differences';
import { FormFrame } from './FormFrame';
import { LostRace } from './LostRace';
import { checkModule, draftOfModule, emptyModule, likeModule, moduleLines, type ModuleDraft } from './module-draft';
import { ModuleFields } from './ModuleFields';
import { RatingFields } from './RatingFields';
import { useForm, type Form } from './use-form';

const Fields = ({ form }: { form: Form<ModuleDraft> }) => (
  <>
    <ModuleFields form={form} />
    <RatingFields form={form} />
  </>
);

interface AddProps {
  vendor: string;
  /** A module to begin from: all that is stated of it but its name. */
  like: ModuleView | null;
  /** The module that was added, and whether its reading is to be started at once. */
  onAdded: (module: ModuleView, start: boolean) => void;
  onCancel: () => void;
  mayStart: boolean;
}

/** A new module of the sheet's vendor. */
export function AddModule({ vendor, like, onAdded, onCancel, mayStart }: AddProps) {
  const [initial] = useState(() => (like ? likeModule(like) : emptyModule(vendor)));
  const start = useRef(mayStart);
  const form = useForm({
    initial,
    prefix: 'module.',
    check: checkModule,
    send: (body) => api.post<ModuleView>('/api/modules', body),
    onSent: (module) => onAdded(module, start.current),
  });
  const submit = (andStart: boolean, event?: SyntheticEvent) => {
    start.current = andStart;
    form.submit(event);
  };
  return (
    <FormFrame
      form={{ ...form, submit: (event) => submit(mayStart, event) }}
      label={`Add a module of ${vendor}`}
      action={mayStart ? 'Add and start a reading' : 'Add the module'}
      onCancel={onCancel}
      more={mayStart && <Button onPress={() => submit(false)}>Add only</Button>}
    >
      <Fields form={form} />
    </FormFrame>
  );
}

interface EditProps {
  module: ModuleView;
  onClose: (after: ModuleView, words: string) => void;
}

const putModule = async ({ id, version }: ModuleView, body: ModuleBody) =>
  (await ask<ModuleView>(`/api/modules/${id}`, { method: 'PUT', body, ifMatch: `"${version}"` })).data;

/** Identity and ratings of a module that is there, to be changed over the version that was seen. */
export function EditModule({ module, onClose }: EditProps) {
  const [base, setBase] = useState(module);
  const [race, setRace] = useState<ModuleBody | null>(null);
  const [initial] = useState(() => draftOfModule(module));
  const lost = (current: unknown, mine: ModuleBody) => {
    const theirs = current as ModuleView;
    if (differences(moduleLines(mine), moduleLines(theirs)).length === 0) return onClose(theirs, 'Saved.');
    setBase(theirs);
    setRace(mine);
  };
  const form = useForm({
    initial,
    prefix: 'module.',
    check: checkModule,
    send: (body) => putModule(base, body),
    onSent: (saved) => onClose(saved, 'Saved.'),
    onLostRace: lost,
  });
  return (
    <>
      {race && (
        <LostRace
          what="module"
          lines={differences(moduleLines(race), moduleLines(base))}
          onKeepMine={() => form.submit()}
          onTakeTheirs={() => onClose(base, 'Theirs was taken.')}
          busy={form.busy}
        />
      )}
      <FormFrame form={form} label="Identity and ratings" action="Save" onCancel={() => onClose(base, '')}>
        <Fields form={form} />
      </FormFrame>
    </>
  );
}
