/** The bench calculations. */
import { BodyText } from '@/shared/ui/components/BodyText';
import { Page } from '@/shared/ui/components/Page';
import { LinkRows } from '@/shared/ui/screens/shell/LinkRows';
import { SHEETS } from '@/shared/workings/list';

/** One ruled row a sheet, with the question that it answers. */
export function WorkingsScreen() {
  return (
    <Page title="Workings" maxWidth={860}>
      <BodyText tone="soft">
        Each sheet shows its formula with the numbers in it, how far it holds, and its source. The same sheets stand behind the steps of a
        tree.
      </BodyText>
      <LinkRows
        caption="Workings"
        rows={SHEETS.map((sheet) => ({ href: `/workings/${sheet.id}`, title: sheet.title, about: sheet.question }))}
      />
    </Page>
  );
}
