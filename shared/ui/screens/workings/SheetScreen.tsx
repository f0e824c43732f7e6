/** One bench calculation. */
import { useRouter } from 'expo-router';
import { useEffect, useMemo, useState } from 'react';

import { EmptyState } from '@/shared/ui/components/EmptyState';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Page } from '@/shared/ui/components/Page';
import { SheetGrounds, SheetHeadline } from '@/shared/ui/screens/workings/SheetAnswerView';
import { SheetForm } from '@/shared/ui/screens/workings/SheetForm';
import { readSheet, sheetFields, startTexts } from '@/shared/ui/screens/workings/sheetForm';
import { sheetById } from '@/shared/workings/list';
import type { AnySheet } from '@/shared/workings/list';
import { runSheet } from '@/shared/workings/sheet';

interface Props {
  sheetId: string;
  /** what stands in the address besides */
  given: Readonly<Record<string, string | string[] | undefined>>;
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

function KnownSheet({ sheet, given }: { sheet: AnySheet; given: Props['given'] }) {
  const router = useRouter();
  const fields = useMemo(() => sheetFields(sheet), [sheet]);
  const [texts, setTexts] = useState<Record<string, string>>(() => ({
    ...startTexts(sheet),
    ...ofAddress(
      fields.map((f) => f.name),
      given,
    ),
  }));
  const [touched, setTouched] = useState(false);
  useEffect(() => {
    if (touched) router.setParams(texts);
  }, [texts, touched, router]);
  const read = readSheet(fields, texts);
  const unread = Object.keys(read.errors).length > 0;
  const answer = unread ? null : runSheet(sheet, read.inputs);
  const errors = answer !== null && !answer.ok ? { ...read.errors, [answer.field]: answer.say } : read.errors;
  return (
    <Page title={sheet.title} eyebrow="Workings" maxWidth={860}>
      <SheetHeadline sheet={sheet} answer={answer?.ok ? answer : null} />
      <SheetForm
        fields={fields}
        texts={texts}
        errors={errors}
        echoes={read.echoes}
        onChange={(name, text) => {
          setTouched(true);
          setTexts((now) => ({ ...now, [name]: text }));
        }}
      />
      <SheetGrounds sheet={sheet} answer={answer?.ok ? answer : null} />
      <LinkText label="All workings" href="/workings" />
    </Page>
  );
}

function ofAddress(names: readonly string[], given: Props['given']): Record<string, string> {
  return Object.fromEntries(names.flatMap((name): [string, string][] => (typeof given[name] === 'string' ? [[name, given[name]]] : [])));
}
