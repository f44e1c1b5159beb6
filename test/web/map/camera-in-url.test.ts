import { describe, expect, it } from 'vitest';
import { formatCamera, parseCamera } from '../../../web/map/camera-in-url.ts';
import { metresPerPixel } from '../../../web/map/map-scale.ts';

const plan = { tiltDeg: 0, bearingDeg: 0 };

describe('the camera in the address', () => {
  it('comes back within a pixel at every zoom', () => {
    for (let zoom = 0; zoom <= 22; zoom += 0.5) {
      const camera = { ...plan, zoom, latitude: 46.750_123_456_7, longitude: -91.300_987_654_3 };
      const back = parseCamera(formatCamera(camera));
      const movedM = Math.abs((back?.latitude ?? 0) - camera.latitude) * 111_320;
      expect(movedM).toBeLessThan(metresPerPixel(zoom, camera.latitude));
      expect(back?.zoom).toBe(zoom);
    }
  });

  it('is short: a view from afar needs few decimals', () => {
    const far = { ...plan, zoom: 11.123, latitude: 46.75012345, longitude: -91.30021345 };
    expect(formatCamera(far)).toBe('11.12/46.75012/-91.30021');
    expect(parseCamera('11.12/46.75012/-91.30021')).toMatchObject(plan);
  });

  it('carries where a tilted view looks', () => {
    const tilted = { zoom: 17, latitude: 46.75, longitude: -91.3, tiltDeg: 55, bearingDeg: -30 };
    const text = formatCamera(tilted);
    expect(text).toMatch(/\/55\/330$/);
    expect(parseCamera(text)).toEqual({ ...tilted, bearingDeg: 330 });
  });

  it('is none where the text holds none', () => {
    for (const text of [
      null,
      '',
      '1/2',
      'a/b/c',
      '//',
      '17/99/0',
      '30/1/1',
      '1/2/3/4',
      '1/2/3/70/0',
      '1/2/3/50/360',
      '1/2/3/4/',
    ]) {
      expect(parseCamera(text)).toBeNull();
    }
  });
});

describe('metresPerPixel', () => {
  it('halves with every zoom and shrinks with the cosine of the latitude', () => {
    expect(metresPerPixel(1, 0)).toBeCloseTo(metresPerPixel(0, 0) / 2, 6);
    expect(metresPerPixel(10, 60)).toBeCloseTo(metresPerPixel(10, 0) / 2, 6);
    // Web Mercator's definition: the equator's 40,075,016.7 m on 512 px.
    expect(metresPerPixel(0, 0)).toBeCloseTo(40_075_016.7 / 512, 0);
  });
});
