/** An address that leads nowhere. */
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Page } from '@/shared/ui/components/Page';

/** Says so, and leads back. */
export function NotFoundScreen() {
  return (
    <Page title="No such page" eyebrow="Lampstep">
      <EmptyState
        title="Nothing is kept at this address"
        text="It may have been mistyped, or what it showed belongs to another workshop. A run under way is not affected."
        action={<LinkText label="To the Bench" href="/" />}
      />
    </Page>
  );
}
