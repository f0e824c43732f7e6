/** What is still in the machine and owed to it. */
import { FactRows } from '@/shared/ui/screens/shell/FactRows';
import type { Run } from '@/shared/ui/screens/run/Run';
import { Label } from '@/shared/ui/components/Label';
import { View } from 'react-native';

const CLASSES = { link: 'link', bypass: 'bypass', series: 'series part', clip: 'clip', lifted: 'lifted or taken out' } as const;

/** Nothing is shown where nothing stays. */
export function StaysFitted({ run }: { run: Run }) {
  const { fitted, owed } = run.view.facts;
  const suspects = run.program.layout.tree.suspects;
  const part = (id: string) => suspects.find((s) => s.id === id)?.part ?? id;
  const rows = [
    ...fitted.map((f) => ({ name: f.name, value: CLASSES[f.class] })),
    ...owed.killers.map((k) => ({ name: part(k.part), value: `before power: rule out ${part(k.killer)}, which may have killed it` })),
  ];
  if (rows.length === 0) return null;
  return (
    <View>
      <Label level={2}>Named on the machine</Label>
      <FactRows caption="Named on the machine" rows={rows} />
    </View>
  );
}
