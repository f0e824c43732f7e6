/** One bench calculation. */
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Page } from '@/shared/ui/components/Page';
import { SheetCaution, SheetDrawings, SheetGrounds, SheetHeadline } from '@/shared/ui/screens/workings/SheetAnswerView';
import type { Given } from '@/shared/ui/screens/workings/sheetAddress';
import { faultWords } from '@/shared/ui/screens/workings/faultWords';
import { SheetForm } from '@/shared/ui/screens/workings/SheetForm';
import { SheetTools } from '@/shared/ui/screens/workings/SheetTools';
import { useSheetForm } from '@/shared/ui/screens/workings/useSheetForm';
import { sheetById } from '@/shared/workings/list';
import type { AnySheet } from '@/shared/workings/list';

interface Props {
  sheetId: string;
  /** what stands in the address besides */
  given: Given;
}

/** Answer first; what is typed stands in the address, so that it can be kept and sent. */
export function SheetScreen({ sheetId, given }: Props) {
  const sheet = sheetById(sheetId);
  if (sheet === undefined) {
    return (
      <Page title="Workings">
        <EmptyState
          title="No such sheet"
          text="There is no bench calculation of that name."
          action={<LinkText label="All workings" href="/workings" />}
        />
      </Page>
    );
  }
  // a new sheet starts with its own fields
  return <KnownSheet key={sheet.id} sheet={sheet} given={given} />;
}

function KnownSheet({ sheet, given }: { sheet: AnySheet; given: Given }) {
  const form = useSheetForm(sheet, given);
  const { answer } = form;
  // below a form of lists nobody would find them
  const drawingsFirst = form.parts.some((part) => part.kind === 'rows');
  const drawings = answer === null ? null : <SheetDrawings answer={answer} />;
  return (
    <Page title={sheet.title} eyebrow="Workings" maxWidth={860}>
      <SheetHeadline sheet={sheet} answer={answer} fault={faultWords(form)} sticks />
      <SheetCaution sheet={sheet} answer={answer} />
      <SheetTools sheet={sheet} form={form} />
      {drawingsFirst ? drawings : null}
      <SheetForm
        parts={form.parts}
        texts={form.texts}
        errors={form.errors}
        echoes={form.echoes}
        taken={form.taken}
        onChange={form.type}
        onReplace={form.replace}
      />
      {drawingsFirst ? null : drawings}
      <SheetGrounds sheet={sheet} answer={answer} />
      <LinkText label="All workings" href="/workings" />
    </Page>
  );
}
