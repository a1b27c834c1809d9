import { describe, expect, it } from 'vitest';
import { openDevice } from './device';

function shelf() {
  const kept = new Map<string, string>();
  return {
    getItem: (key: string) => kept.get(key) ?? null,
    setItem: (key: string, value: string) => void kept.set(key, value),
  };
}

describe('openDevice', () => {
  it('is the same device after a reload, and counts on', () => {
    const kept = shelf();
    const first = openDevice(kept);
    expect([first.nextSeq(), first.nextSeq()]).toEqual([1, 2]);
    const reloaded = openDevice(kept);
    expect(reloaded.id).toBe(first.id);
    expect(reloaded.nextSeq()).toBe(3);
  });

  it('works where nothing may be kept', () => {
    const forbidden = {
      getItem: () => {
        throw new Error('denied');
      },
      setItem: () => {
        throw new Error('denied');
      },
    };
    for (const kept of [forbidden, undefined]) {
      const device = openDevice(kept);
      expect(device.id).toMatch(/^[0-9a-f-]{36}$/);
      expect([device.nextSeq(), device.nextSeq()]).toEqual([1, 2]);
    }
  });
});
