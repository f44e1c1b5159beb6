import { describe, expect, it } from 'vitest';
import { readDraft } from '../../../../web/features/reports/stored-draft.ts';

describe('readDraft', () => {
  it('gives back what was stored', () => {
    const draft = { narrative: 'Two paragraphs.', recommendation: 'Lower it.' };
    expect(readDraft(JSON.stringify(draft))).toEqual(draft);
  });

  it('is empty where nothing sound is stored', () => {
    for (const text of [null, '', '{', '[]', '{"narrative":1}']) {
      expect(readDraft(text)).toEqual({ narrative: '', recommendation: '' });
    }
  });
});
