import { describe, expect, it } from 'vitest';
import { createLatestWins } from '../../../../../web/features/studies/live/latest-wins.ts';

/** Questions wait until the test answers them. */
function startAsking() {
  const asked: { question: number; answer: (text: string) => void; fail: (e: Error) => void }[] =
    [];
  const shown: string[] = [];
  const asker = createLatestWins<number, string>({
    ask: (question) =>
      new Promise((answer, fail) => {
        asked.push({ question, answer, fail });
      }),
    onAnswer: (answer) => shown.push(answer),
    onError: (error) => shown.push(String(error)),
  });
  return { asked, shown, asker };
}

/** Lets what has been answered be worked on. */
const settle = () => new Promise((resolve) => setTimeout(resolve));

describe('the latest question', () => {
  it('is the only one of those that came while another was being answered', async () => {
    const { asked, shown, asker } = startAsking();
    for (const question of [1, 2, 3, 4]) asker.want(question);
    expect(asked.map(({ question }) => question)).toEqual([1]);
    asked[0]?.answer('one');
    await settle();
    expect(asked.map(({ question }) => question)).toEqual([1, 4]);
    // The answer to a question that was left behind is shown too, so that dragging shows something.
    expect(shown).toEqual(['one']);
    asked[1]?.answer('four');
    await settle();
    expect(shown).toEqual(['one', 'four']);
  });

  it('is asked after one that failed', async () => {
    const { asked, shown, asker } = startAsking();
    asker.want(1);
    asker.want(2);
    asked[0]?.fail(new Error('broken'));
    await settle();
    asked[1]?.answer('two');
    await settle();
    expect(shown).toEqual(['Error: broken', 'two']);
  });

  it('gets no answer after closing', async () => {
    const { asked, shown, asker } = startAsking();
    asker.want(1);
    asker.want(2);
    asker.close();
    asked[0]?.answer('one');
    await settle();
    asker.want(3);
    expect(asked).toHaveLength(1);
    expect(shown).toEqual([]);
  });
});
