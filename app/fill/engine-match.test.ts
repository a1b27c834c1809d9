import { describe, expect, it, vi } from 'vitest';
import { ENGINE_VERSION } from '~/air';
import { reloadForEngine } from './engine-match';

function page(isKeeping = true) {
  const kept = new Map<string, string>();
  const refuse = () => {
    throw new Error('denied');
  };
  const sessionStorage = {
    getItem: isKeeping ? (key: string) => kept.get(key) ?? null : refuse,
    setItem: (key: string, value: string) => void kept.set(key, value),
  } as Storage;
  const reload = vi.fn();
  return { reload, window: { sessionStorage, location: { reload } as unknown as Location } };
}

describe('a page with another engine than the server', () => {
  it('is loaded anew, once for each version', () => {
    const { reload, window } = page();
    expect(reloadForEngine('newer', window)).toBe(true);
    expect(reloadForEngine('newer', window)).toBe(false);
    expect(reload).toHaveBeenCalledTimes(1);
    expect(reloadForEngine('newest', window)).toBe(true);
    expect(reload).toHaveBeenCalledTimes(2);
  });

  it('is left alone when the engines agree, or when nothing can be kept', () => {
    const { reload, window } = page();
    expect(reloadForEngine(ENGINE_VERSION, window)).toBe(false);
    expect(reloadForEngine('newer', page(false).window)).toBe(false);
    expect(reload).not.toHaveBeenCalled();
  });
});
