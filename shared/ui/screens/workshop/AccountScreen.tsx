/** The own account: where one is signed in, and the password. */
import { Page } from '@/shared/ui/components/Page';
import { LinkText } from '@/shared/ui/components/LinkText';
import { ChangePassword } from '@/shared/ui/screens/workshop/ChangePassword';
import { OwnSessions } from '@/shared/ui/screens/workshop/OwnSessions';

/** What is here is one's own alone; nobody else of the workshop sees it. */
export function AccountScreen() {
  return (
    <Page title="My account" eyebrow="Workshop" maxWidth={860}>
      <OwnSessions />
      <ChangePassword />
      <LinkText label="Workshop" href="/workshop" />
    </Page>
  );
}
