import { fireEvent, screen, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { ErrorState } from '@/shared/ui/components/ErrorState';
import { Loading } from '@/shared/ui/components/Loading';
import { Notice } from '@/shared/ui/components/Notice';
import { Page } from '@/shared/ui/components/Page';
import { StopBar } from '@/shared/ui/components/StopBar';
import { Verdict } from '@/shared/ui/components/Verdict';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

describe('ErrorState', () => {
  it('says what happened and what to do, and tries again', () => {
    const onRetry = vi.fn();
    renderSheet(<ErrorState happened="The record could not be fetched" todo="Nothing is lost." onRetry={onRetry} />);
    expect(screen.getByRole('alert').textContent).toContain('Nothing is lost.');
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(onRetry).toHaveBeenCalledTimes(1);
  });
});

describe('Loading', () => {
  it('says what it waits for', () => {
    renderSheet(<Loading what="the record" />);
    expect(screen.getByRole('status').textContent).toBe('Fetching the record …');
  });
});

describe('Notice', () => {
  it('is read out only when it is live', () => {
    renderSheet(
      <>
        <Notice>Quiet.</Notice>
        <Notice live kind="alarm">
          Loud.
        </Notice>
      </>,
    );
    expect(screen.getByRole('alert').textContent).toBe('Loud.');
    expect(screen.queryByRole('status')).toBeNull();
  });
});

describe('Verdict', () => {
  it('says the word and what stands behind it', () => {
    renderSheet(<Verdict mark="close" word="In, but close" note="0.03 from the low limit" />);
    expect(screen.getByRole('status').textContent).toBe('In, but close0.03 from the low limit');
  });
});

describe('Page', () => {
  it('is one main region that holds its title and its foot', () => {
    renderSheet(
      <Page title="Records" foot={<StopBar onPress={() => undefined} />}>
        {null}
      </Page>,
    );
    const main = within(screen.getByRole('main'));
    expect(main.getByRole('heading', { level: 1, name: 'Records' })).toBeTruthy();
    expect(main.getByRole('button', { name: 'STOP, MAKE SAFE' })).toBeTruthy();
  });
});
