import { describe, expect, it, vi } from 'vitest';
import {
  openLiveClient,
  type WorkerPort,
} from '../../../../../web/features/studies/live/live-client.ts';
import type {
  LiveAnswer,
  LiveQuestion,
} from '../../../../../web/features/studies/live/live-messages.ts';

/** A worker whose answers the test gives. */
function startClient() {
  const questions: LiveQuestion[] = [];
  const port: WorkerPort = {
    postMessage: (question) => questions.push(question),
    onmessage: null,
    onerror: null,
    terminate: vi.fn(),
  };
  const onReady = vi.fn();
  const onBroken = vi.fn();
  const client = openLiveClient(port, 'study-1', { onReady, onBroken });
  return {
    client,
    port,
    questions,
    onReady,
    onBroken,
    answer: async (data: LiveAnswer) => {
      port.onmessage?.(new MessageEvent('message', { data }));
      await Promise.resolve();
      await Promise.resolve();
    },
  };
}

describe('the client of the drawing engine', () => {
  it('opens the study first, and says when it can be asked', async () => {
    const { questions, onReady, onBroken, answer } = startClient();
    expect(questions).toEqual([{ kind: 'open', studyId: 'study-1' }]);
    expect(onReady).not.toHaveBeenCalled();
    await answer({ kind: 'open' });
    expect(onReady).toHaveBeenCalledOnce();
    expect(onBroken).not.toHaveBeenCalled();
  });

  it('asks for shadows before the days that wait, and for no day that nobody waits for', async () => {
    const { client, questions, answer } = startClient();
    await answer({ kind: 'open' });
    const gone = new AbortController();
    const first = client.dayOf('12', '2026-12-21');
    const second = client.dayOf('14', '2026-12-21', gone.signal);
    const third = client.dayOf('16', '2026-12-21');
    const shadows = client.shadowsAt('2026-12-21T12:00:00Z');
    gone.abort();
    await answer({ kind: 'day', day: null });
    await answer({ kind: 'shadows', drawn: null });
    await answer({ kind: 'day', day: null });
    await expect(second).rejects.toThrow('Nobody waits');
    await expect(Promise.all([first, third, shadows])).resolves.toEqual([null, null, null]);
    expect(questions.slice(1)).toEqual([
      { kind: 'day', receptor: '12', date: '2026-12-21' },
      { kind: 'shadows', at: '2026-12-21T12:00:00Z' },
      { kind: 'day', receptor: '16', date: '2026-12-21' },
    ]);
  });

  it('passes on what the worker could not compute, and goes on', async () => {
    const { client, answer, onBroken } = startClient();
    await answer({ kind: 'open' });
    const broken = client.losersOn('2026-12-21');
    const next = client.losersOn('2026-06-21');
    await answer({ kind: 'failed', message: 'no such day' });
    await expect(broken).rejects.toThrow('no such day');
    await answer({ kind: 'losers', losers: [] });
    await expect(next).resolves.toEqual([]);
    expect(onBroken).not.toHaveBeenCalled();
  });

  it('says that the engine is not there when the study could not be opened', async () => {
    const { answer, onReady, onBroken } = startClient();
    await answer({ kind: 'failed', message: 'no WebAssembly' });
    expect(onBroken).toHaveBeenCalledOnce();
    expect(onReady).not.toHaveBeenCalled();
  });

  it('refuses every question once the worker broke or was closed', async () => {
    const { client, port, onBroken, answer } = startClient();
    await answer({ kind: 'open' });
    const asked = client.shadowsAt('2026-12-21T12:00:00Z');
    port.onerror?.(new ErrorEvent('error'));
    await expect(asked).rejects.toThrow('broke');
    expect(onBroken).toHaveBeenCalledOnce();
    await expect(client.losersOn('2026-12-21')).rejects.toThrow('closed');
    client.close();
    expect(port.terminate).toHaveBeenCalledOnce();
  });
});
