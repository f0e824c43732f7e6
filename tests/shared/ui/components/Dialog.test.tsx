import { fireEvent, screen } from '@testing-library/react';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Dialog } from '@/shared/ui/components/Dialog';
import { Field } from '@/shared/ui/components/Field';
import { wrapTab } from '@/shared/ui/components/focusTrap';
import { StopBar } from '@/shared/ui/components/StopBar';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

function Sheet({ mustAnswer = false, stop = false, field = false }: { mustAnswer?: boolean; stop?: boolean; field?: boolean }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button label="Accept" onPress={() => setOpen(true)} />
      {open ? (
        <Dialog
          title="Accept this record?"
          onClose={mustAnswer ? undefined : () => setOpen(false)}
          foot={stop ? <StopBar onPress={() => setOpen(false)} /> : undefined}
          actions={
            <>
              <Button label="Not yet" onPress={() => setOpen(false)} />
              <Button kind="primary" label="Sign" onPress={() => setOpen(false)} />
            </>
          }
        >
          <BodyText>The supply may go back.</BodyText>
          {field ? <Field label="Remark" value="" onChangeText={() => undefined} /> : null}
        </Dialog>
      ) : null}
    </>
  );
}

function openIt() {
  const opener = screen.getByRole('button', { name: 'Accept' });
  opener.focus();
  fireEvent.click(opener);
  return { opener, dialog: screen.getByRole('dialog', { name: 'Accept this record?' }) };
}

describe('Dialog', () => {
  it('is modal, named by its title, and takes the focus', () => {
    renderSheet(<Sheet />);
    const { dialog } = openIt();
    expect(dialog.getAttribute('aria-modal')).toBe('true');
    expect(document.activeElement).toBe(dialog);
  });

  it('closes on Escape and gives the focus back', () => {
    renderSheet(<Sheet />);
    const { opener, dialog } = openIt();
    fireEvent.keyDown(dialog, { key: 'Escape' });
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(document.activeElement).toBe(opener);
  });

  it('closes on Escape and keeps Tab from inside a text field too', () => {
    renderSheet(<Sheet field />);
    openIt();
    const remark = screen.getByRole('textbox', { name: 'Remark' });
    remark.focus();
    fireEvent.keyDown(remark, { key: 'Tab', shiftKey: true });
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Sign' }));
    fireEvent.keyDown(remark, { key: 'Escape' });
    expect(screen.queryByRole('dialog')).toBeNull();
  });

  it('gives the focus back when it is answered', () => {
    renderSheet(<Sheet />);
    const { opener } = openIt();
    fireEvent.click(screen.getByRole('button', { name: 'Sign' }));
    expect(document.activeElement).toBe(opener);
  });

  it('stays when it must be answered', () => {
    renderSheet(<Sheet mustAnswer />);
    const { dialog } = openIt();
    fireEvent.keyDown(dialog, { key: 'Escape' });
    expect(screen.getByRole('dialog')).toBeTruthy();
  });

  it('keeps Tab inside, both ways round', () => {
    renderSheet(<Sheet />);
    const { dialog } = openIt();
    fireEvent.keyDown(dialog, { key: 'Tab' });
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Not yet' }));
    fireEvent.keyDown(document.activeElement as Element, { key: 'Tab', shiftKey: true });
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Sign' }));
    fireEvent.keyDown(document.activeElement as Element, { key: 'Tab' });
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Not yet' }));
  });

  it('leaves Stop in reach of touch and Tab', () => {
    renderSheet(<Sheet stop />);
    const { dialog } = openIt();
    fireEvent.keyDown(dialog, { key: 'Tab', shiftKey: true });
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'STOP, MAKE SAFE' }));
  });
});

describe('wrapTab', () => {
  it('moves by force only at the ends', () => {
    const stops = ['a', 'b', 'c'];
    expect(wrapTab(stops, 'a', false)).toBeNull();
    expect(wrapTab(stops, 'c', false)).toBe('a');
    expect(wrapTab(stops, 'a', true)).toBe('c');
    expect(wrapTab(stops, 'b', true)).toBeNull();
    expect(wrapTab([], null, false)).toBeNull();
  });
});
