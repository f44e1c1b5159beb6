import { cleanup, fireEvent, screen, waitFor } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { CommentForm } from '../../../../web/features/comments/components/comment-form.tsx';
import { renderInPlace, withPlainSpaces } from '../../support/render-in-place.tsx';
import { stubFetch } from '../../support/stub-fetch.ts';

const receipt = {
  id: '00000000-0000-4000-8000-000000000001',
  receivedAt: '2026-12-01T16:00:00Z',
};
const pin = { lngLat: [-91.3, 46.75] as [number, number], words: '12 Tallowreed Row' };

function show(chosen: typeof pin | null = pin, onRemovePin = vi.fn()) {
  renderInPlace(<CommentForm reference="2026-0001" pin={chosen} onRemovePin={onRemovePin} />);
  return { onRemovePin };
}

function write(label: string, text: string) {
  fireEvent.change(screen.getByLabelText(label), { target: { value: text } });
}

const send = () => fireEvent.click(screen.getByRole('button', { name: 'Send the comment' }));

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('the comment form', () => {
  it('says what is missing in each field and sends nothing', async () => {
    const sent = stubFetch(201, receipt);
    show();
    send();
    expect(await screen.findByText(/Write what you want to say\./)).toBeDefined();
    expect(screen.getByText(/Write your name\./)).toBeDefined();
    expect(screen.getByText(/Write an e-mail address/)).toBeDefined();
    expect(sent).toHaveLength(0);
  });

  it('sends the comment with its pin and tells when it arrived', async () => {
    const sent = stubFetch(201, receipt);
    show();
    write('What do you want to say?', 'My yard lies in shade all winter.');
    write('Your name', 'Hedwin Marchbole');
    write('Your e-mail address', 'hedwin@town.example');
    send();
    const thanks = await screen.findByText(/Your comment arrived/);
    expect(withPlainSpaces(thanks.textContent)).toContain('December 1, 2026, 10:00 a.m. CST');
    expect(sent[0]).toMatchObject({
      method: 'POST',
      url: '/api/cases/2026-0001/comments',
      body: {
        authorName: 'Hedwin Marchbole',
        authorEmail: 'hedwin@town.example',
        body: 'My yard lies in shade all winter.',
        pin: [-91.3, 46.75],
      },
    });
    expect(sent[0]?.headers.get('Idempotency-Key')).toMatch(/^[0-9a-f-]{36}$/);
  });

  it('lets the person take the pin off', () => {
    const { onRemovePin } = show();
    fireEvent.click(screen.getByRole('button', { name: /about the case as a whole/ }));
    expect(onRemovePin).toHaveBeenCalledOnce();
  });

  it('keeps what was written when the server refuses it', async () => {
    stubFetch(429, {
      type: 'about:blank',
      title: 'Wait a few minutes, then send it again.',
      status: 429,
      code: 'RATE_LIMITED',
    });
    show(null);
    write('What do you want to say?', 'My yard lies in shade all winter.');
    write('Your name', 'Hedwin Marchbole');
    write('Your e-mail address', 'hedwin@town.example');
    send();
    expect(await screen.findByText('Wait a few minutes, then send it again.')).toBeDefined();
    await waitFor(() =>
      expect(screen.getByLabelText('What do you want to say?')).toHaveProperty(
        'value',
        'My yard lies in shade all winter.',
      ),
    );
  });
});
