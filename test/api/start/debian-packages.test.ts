import { describe, expect, it } from 'vitest';
import {
  describeInstallCommand,
  installMissingPackages,
  namesOfHalfInstalled,
} from '../../../api/start/debian-packages.mjs';
import { Lifetime } from '../../../api/start/lifetime.mjs';

describe('Debian packages', () => {
  it('asks nothing of the system when all is there', async () => {
    const wanted = [{ name: 'dash', provides: '/bin/sh' }];
    expect(await installMissingPackages(new Lifetime(), wanted)).toEqual([]);
  });

  it('finds those whose installation was interrupted', () => {
    const list = 'postgresql-15 installed\nchromium half-configured\npoppler-utils unpacked\n';
    expect(namesOfHalfInstalled(list)).toEqual(['chromium', 'poppler-utils']);
  });

  it('gives someone who is not root one command to run', () => {
    expect(describeInstallCommand(['postgresql-15', 'chromium'])).toBe(
      'sudo apt-get update && sudo apt-get install -y --no-install-recommends postgresql-15 chromium',
    );
  });
});
