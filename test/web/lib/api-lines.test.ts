import { afterEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { callApiForLines } from '../../../web/lib/api-client.ts';

afterEach(() => vi.unstubAllGlobals());

/** Answers in these pieces, which end anywhere. */
function answerInPieces(pieces: readonly Uint8Array[]): void {
  const body = new ReadableStream<Uint8Array>({
    start: (controller) => {
      for (const piece of pieces) controller.enqueue(piece);
      controller.close();
    },
  });
  vi.stubGlobal('fetch', () => Promise.resolve(new Response(body)));
}

async function linesOf(): Promise<unknown[]> {
  const lines: unknown[] = [];
  for await (const line of callApiForLines(z.object({ word: z.string() }), '/lines', {})) {
    lines.push(line.word);
  }
  return lines;
}

describe('an answer that comes line by line', () => {
  it('is read whole wherever its pieces end, in the middle of a letter too', async () => {
    const bytes = new TextEncoder().encode('{"word":"Süd"}\n{"word":"Ost"}\n{"word":"West"}');
    for (let cut = 0; cut <= bytes.length; cut += 1) {
      answerInPieces([bytes.slice(0, cut), bytes.slice(cut)]);
      expect(await linesOf()).toEqual(['Süd', 'Ost', 'West']);
    }
  });

  it('is refused as any other answer is', async () => {
    const problem = { title: 'No.', status: 409, code: 'STUDY_NOT_FINISHED' };
    vi.stubGlobal('fetch', () =>
      Promise.resolve(new Response(JSON.stringify(problem), { status: 409 })),
    );
    await expect(linesOf()).rejects.toThrow('No.');
  });

  it('fails where a line is not what was agreed', async () => {
    answerInPieces([new TextEncoder().encode('{"word":1}\n')]);
    await expect(linesOf()).rejects.toThrow();
  });
});
