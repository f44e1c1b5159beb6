import { mkdirSync, renameSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { hashInputs } from '../../../api/start/web-build.mjs';
import { makeTemporaryFolder } from './temporary-folder.ts';

describe('hashInputs', () => {
  it('changes with a content, a name or a new file, and with nothing else', () => {
    const folder = makeTemporaryFolder();
    const inputs = ['web', 'vite.config.ts', 'absent'];
    mkdirSync(path.join(folder, 'web/map'), { recursive: true });
    writeFileSync(path.join(folder, 'web/main.tsx'), 'one');
    writeFileSync(path.join(folder, 'web/map/a.ts'), 'two');
    writeFileSync(path.join(folder, 'README.md'), 'not an input');
    const first = hashInputs(folder, inputs);

    writeFileSync(path.join(folder, 'README.md'), 'changed');
    writeFileSync(path.join(folder, 'web/main.tsx'), 'one');
    expect(hashInputs(folder, inputs)).toBe(first);

    writeFileSync(path.join(folder, 'web/main.tsx'), 'other');
    const second = hashInputs(folder, inputs);
    renameSync(path.join(folder, 'web/map/a.ts'), path.join(folder, 'web/map/b.ts'));
    const third = hashInputs(folder, inputs);
    writeFileSync(path.join(folder, 'vite.config.ts'), '');
    const fourth = hashInputs(folder, inputs);
    expect(new Set([first, second, third, fourth]).size).toBe(4);
  });
});
