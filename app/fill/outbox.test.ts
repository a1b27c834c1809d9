import { beforeEach, describe, expect, it } from 'vitest';
import { createOutbox, type Outbox } from './outbox';
import type { Command, OutboxRequest } from './outbox-items';
import { memoryStorage, type OutboxStorage } from './outbox-storage';
import type { Answer } from './outbox-verdict';
import type { OutboxState } from './store';
import type { WireEvent } from './wire-events';

/** A network whose answers the test gives, and timers that the test lets ring. */
let sent: (OutboxRequest & {
  answer: (answer: Answer) => Promise<void>;
  fail: () => Promise<void>;
})[];
let timers: { ms: number; ring: () => void }[];
let acknowledged: string[];
let outbox: Outbox;
let storage: OutboxStorage;
let shown: OutboxState;

/** Lets everything that has been answered take its course. */
const settle = async () => {
  for (let turn = 0; turn < 10; turn++) await Promise.resolve();
};

const ok: Answer = { status: 200, body: {} };
const refusal = (status: number, errors: object[] = [], code = 'refused'): Answer => ({
  status,
  body: { status, code, detail: 'No.', errors },
});

beforeEach(() => {
  sent = [];
  timers = [];
  acknowledged = [];
  storage = memoryStorage();
  outbox = makeOutbox();
});

function makeOutbox() {
  return createOutbox({
    storage,
    random: () => 0.5,
    send: (request) =>
      new Promise<Answer>((resolve, reject) => {
        const then = async (act: () => void) => {
          act();
          await settle();
        };
        sent.push({
          ...request,
          answer: (answer) => then(() => resolve(answer)),
          fail: () => then(() => reject(new TypeError('no network'))),
        });
      }),
    after: (ms, ring) => {
      const timer = { ms, ring };
      timers.push(timer);
      return () => {
        timers = timers.filter((other) => other !== timer);
      };
    },
    onAcknowledged: ({ items }) => void acknowledged.push(...items.map(({ id }) => id)),
    onChange: (state) => {
      shown = state;
    },
  });
}

const put = (id: string, needs: string | null = null): Command => ({
  subject: needs ? 'run' : 'round',
  id,
  address: `/api/${id}`,
  body: { of: id },
  needs,
});
const tap = (id: string, run = 'run-1', deviceId = 'phone'): Command => ({
  subject: 'event',
  id,
  address: `/api/v1/runs/${run}/events`,
  needs: run,
  deviceId,
  body: { id, type: 'cut-out' } as WireEvent,
});
const idsOf = (request: OutboxRequest | undefined) => request?.items.map(({ id }) => id);
const last = () => sent.at(-1)!;

describe('the order of sending', () => {
  it('is the order of recording, one request at a time', async () => {
    outbox.add([put('round-1'), put('run-1', 'round-1'), tap('a'), tap('b')]);
    expect(sent).toHaveLength(1);
    await last().answer(ok);
    expect(idsOf(last())).toEqual(['run-1']);
    await last().answer(ok);
    expect(idsOf(last())).toEqual(['a', 'b']);
    await last().answer(ok);
    expect(acknowledged).toEqual(['round-1', 'run-1', 'a', 'b']);
    expect(shown).toMatchObject({ pending: 0, refused: [] });
  });

  it('gathers what is tapped while a request is on its way into one batch', async () => {
    outbox.add([tap('a')]);
    outbox.add([tap('b')]);
    outbox.add([tap('c')]);
    expect(idsOf(last())).toEqual(['a']);
    await last().answer(ok);
    expect(idsOf(last())).toEqual(['b', 'c']);
    expect(last().body).toMatchObject({
      v: 1,
      deviceId: 'phone',
      events: [{ id: 'b' }, { id: 'c' }],
    });
  });

  it('puts neighbours of one run only into a batch, and no more than 500', async () => {
    outbox.add([tap('a', 'run-1'), tap('b', 'run-2'), tap('c', 'run-2'), put('round-9')]);
    expect(idsOf(last())).toEqual(['a']);
    await last().answer(ok);
    expect(idsOf(last())).toEqual(['b', 'c']);
    await last().answer(ok);
    expect(idsOf(last())).toEqual(['round-9']);
    await last().answer(ok);
    outbox.add(Array.from({ length: 501 }, (_, place) => tap(`t${place}`)));
    expect(last().items).toHaveLength(500);
  });
});

describe('trying again', () => {
  it('keeps everything and waits by full jitter when no answer comes', async () => {
    outbox.add([tap('a')]);
    const waits: number[] = [];
    for (let attempt = 0; attempt < 9; attempt++) {
      await last().fail();
      expect(shown).toMatchObject({ pending: 1, retrying: true });
      waits.push(timers[0]!.ms);
      const { ring } = timers.splice(0)[0]!;
      ring();
    }
    // Half (the jitter here) of 0.5 s doubled each time, up to 30 s.
    expect(waits).toEqual([500, 1000, 2000, 4000, 8000, 15_000, 15_000, 15_000, 15_000]);
    await last().answer(ok);
    expect(acknowledged).toEqual(['a']);
    expect(sent).toHaveLength(10);
  });

  it.each([408, 425, 429, 500, 502, 503])('tries again after %i', async (status) => {
    outbox.add([tap('a')]);
    await last().answer(refusal(status));
    expect(shown).toMatchObject({ pending: 1, refused: [], retrying: true });
  });

  it('waits at least as long as the server asks', async () => {
    outbox.add([tap('a')]);
    await last().answer({ status: 429, body: {}, retryAfterMs: 7000 });
    expect(timers[0]?.ms).toBe(7500);
  });

  it('goes at once when the signal returns, and starts the waits anew after a success', async () => {
    outbox.add([tap('a')]);
    await last().fail();
    await last().fail();
    outbox.flush();
    expect(timers).toEqual([]);
    expect(sent).toHaveLength(2);
    await last().answer(ok);
    outbox.add([tap('b')]);
    await last().fail();
    expect(timers[0]?.ms).toBe(500);
  });

  it('does not send while it waits, though more is recorded', async () => {
    outbox.add([tap('a')]);
    await last().fail();
    outbox.add([tap('b')]);
    expect(sent).toHaveLength(1);
    timers[0]!.ring();
    expect(idsOf(last())).toEqual(['a', 'b']);
  });

  it('pauses when nobody is signed in and goes on when somebody is', async () => {
    outbox.add([tap('a')]);
    await last().answer(refusal(401));
    outbox.flush();
    outbox.add([tap('b')]);
    expect(shown).toMatchObject({ pending: 2, paused: true, refused: [] });
    expect(sent).toHaveLength(1);
    outbox.resume();
    expect(idsOf(last())).toEqual(['a', 'b']);
  });
});

describe('what is refused', () => {
  it('sets only the named items aside and sends the rest', async () => {
    outbox.add([put('x')]);
    outbox.add([tap('a'), tap('b'), tap('c'), tap('d')]);
    await last().answer(ok);
    const errors = [
      { index: 1, field: 'events.kpa', value: 9000, expected: '0 to 1400 kPa' },
      { index: 3, field: 'events.type', value: 'x', expected: 'one of' },
    ];
    await last().answer(refusal(400, errors, 'bad-input'));
    expect(idsOf(last())).toEqual(['a', 'c']);
    await last().answer(ok);
    expect(acknowledged).toEqual(['x', 'a', 'c']);
    expect(shown.refused.map(({ item }) => item.id)).toEqual(['b', 'd']);
    expect(shown.refused[0]?.problem).toMatchObject({
      status: 400,
      code: 'bad-input',
      field: 'events.kpa',
      value: 9000,
      expected: '0 to 1400 kPa',
    });
  });

  it.each([400, 403, 404, 409, 413, 415])(
    'sets all aside after %i without places',
    async (status) => {
      outbox.add([tap('a'), tap('b')]);
      await last().answer(refusal(status));
      expect(shown).toMatchObject({ pending: 0, retrying: false });
      expect(shown.refused.map(({ item }) => item.id)).toEqual(['a', 'b']);
      expect(acknowledged).toEqual([]);
    },
  );

  it('holds back what builds on something refused, and sends what doesn’t', async () => {
    outbox.add([put('run-1', 'round-1'), tap('a'), put('round-2')]);
    const open = { field: 'runId', value: 'run-0', expected: 'no other fill' };
    await last().answer(refusal(409, [open], 'fill-open'));
    expect(idsOf(last())).toEqual(['round-2']);
    await last().answer(ok);
    outbox.add([tap('b')]);
    expect(shown.refused.map(({ item, problem }) => [item.id, problem.code])).toEqual([
      ['run-1', 'fill-open'],
      ['a', 'waits-for-refused'],
      ['b', 'waits-for-refused'],
    ]);
    expect(shown.refused[0]?.problem.value).toBe('run-0');
  });

  it('goes back into its place when the person sends it again', async () => {
    outbox.add([put('run-1', 'round-1'), tap('a')]);
    await last().answer(refusal(409));
    outbox.add([put('round-3')]);
    outbox.retryRefused();
    await last().answer(ok);
    expect(idsOf(last())).toEqual(['run-1']);
    await last().answer(ok);
    expect(idsOf(last())).toEqual(['a']);
    expect(shown.refused).toEqual([]);
  });
});

describe('what is kept', () => {
  const keptIds = async () => (await storage.load()).map(({ item }) => item.id);

  it('is deleted only when it is acknowledged', async () => {
    outbox.add([put('round-1'), tap('a'), tap('b')]);
    await last().answer(ok);
    await last().answer(refusal(400, [{ index: 0, field: 'kpa', expected: 'less' }]));
    expect(await keptIds()).toEqual(['a', 'b']);
    await last().answer(ok);
    expect(await keptIds()).toEqual(['a']);
    expect((await storage.load())[0]?.problem?.status).toBe(400);
  });

  it('is taken up by the next page: queue, order and refusals', async () => {
    outbox.add([put('run-1', 'round-1'), put('round-2'), tap('b', 'run-2')]);
    await last().answer(refusal(409));
    await last().fail();
    outbox = makeOutbox();
    await outbox.load();
    await settle();
    expect(idsOf(last())).toEqual(['round-2']);
    expect(shown.refused.map(({ item }) => item.id)).toEqual(['run-1']);
    outbox.add([tap('c', 'run-2')]);
    await last().answer(ok);
    expect(idsOf(last())).toEqual(['b', 'c']);
  });

  it('is sent out of turn by a page that goes, as far as it can be understood', async () => {
    outbox.add([tap('a', 'run-0')]);
    outbox.add([tap('b', 'run-0'), put('run-1', 'round-0'), tap('c', 'run-1'), tap('d', 'run-0')]);
    const before = sent.length;
    outbox.flushBeforeLeaving();
    const leaving = sent.slice(before).map(idsOf);
    expect(leaving).toEqual([['a', 'b'], ['run-1'], ['d']]);
    await sent[0]!.answer(ok);
    expect(idsOf(last())).toEqual(['b']);
  });
});
