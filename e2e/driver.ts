import type { Page } from '@playwright/test';
import { createPracticeCoach, type PracticeCoach, type PracticeOptions } from '../app/air';
import { kpaPerPsi } from '../app/units';

/** Half a second of the page's clock and of the simulated coach at a time. */
const tickS = 0.5;
/** Between a call and the hand that follows it, s (common practice). */
const handsS = 1.5;
/** Unasked, a gauge is read this often, s. */
const readEveryS = 20;

/** What the live screen shows of itself. */
interface Seen {
  call: string;
  answer: string;
  task: string;
  keypad: boolean;
  question: string;
}

/** React renders in messages of its own, which the held clock does not hold: two turns let it end. */
const painted = async () => {
  for (let turn = 0; turn < 2; turn++) {
    await new Promise((resolve) => {
      const { port1, port2 } = new MessageChannel();
      port1.onmessage = resolve;
      port2.postMessage(0);
    });
  }
};

/**
 * A driver with a helper, at a coach that the engine's own step function runs. Looks at the live
 * screen, does what it says and taps what that coach's gauges read. The page's clock and the coach
 * go forward together, so nothing waits.
 */
export class Driver {
  readonly coach: PracticeCoach;
  #call = '';
  #since = 0;
  #lastReading = Number.NEGATIVE_INFINITY;
  /** Calls in the order in which they were seen. */
  readonly calls: string[] = [];

  constructor(
    private readonly page: Page,
    air: PracticeOptions,
  ) {
    this.coach = createPracticeCoach(air);
  }

  /** Follows the calls until `until` is shown, or `seconds` have passed. */
  async follow(until: string, seconds: number): Promise<void> {
    const end = this.coach.at + seconds;
    while (this.coach.at < end) {
      await this.#tick();
      const seen = await this.#look();
      if (seen.call === until) return;
      await this.#act(seen);
    }
    throw new Error(`no ${until} within ${seconds} s; the calls were ${this.calls.join(', ')}`);
  }

  async #tick(): Promise<void> {
    const heard = this.coach.advance(tickS);
    await this.page.clock.runFor(tickS * 1000);
    await this.page.evaluate(painted);
    if (heard.some(({ type }) => type === 'cut-out')) await this.#press('It purged');
  }

  async #look(): Promise<Seen> {
    const seen = await this.page.evaluate(() => ({
      call: document.querySelector('main.live')?.getAttribute('data-call') ?? '',
      answer: document.querySelector('.key-row-answer .key')?.textContent ?? '',
      task: document.querySelector('.notice[data-kind=task] .key')?.textContent ?? '',
      keypad: document.querySelector('.keypad') !== null,
      question: document.querySelector('.question .key')?.textContent ?? '',
    }));
    if (seen.call !== this.#call) {
      this.#call = seen.call;
      this.#since = this.coach.at;
      this.calls.push(seen.call);
    }
    return seen;
  }

  async #act(seen: Seen): Promise<void> {
    if (seen.question) return this.#press(seen.question);
    if (seen.task === 'Fast idle is set' || /idle/i.test(seen.task)) {
      this.coach.setEngine('fast-idle');
      return this.#press(seen.task);
    }
    const asked = seen.call === 'read-supply' || seen.call === 'check';
    if (this.coach.at - this.#lastReading > (asked ? 3 : readEveryS)) return this.#readSupply(seen);
    if (this.coach.at - this.#since < handsS) return;
    return this.#answer(seen);
  }

  async #answer({ call, answer, keypad }: { call: string; answer: string; keypad: boolean }) {
    switch (call) {
      case 'chuck-on':
      case 'chuck-off':
        await this.#press(answer);
        return this.coach.setChuck(call === 'chuck-on');
      case 'lower-supply':
      case 'stop-lowering':
        await this.#press(answer);
        return this.coach.setLowering('drain', call === 'lower-supply');
      case 'gauge-tire':
        return keypad ? this.#type(this.coach.tireKpa(), 2) : undefined;
      case 'bleed':
        this.coach.setBleeding(true);
        this.coach.advance(2);
        this.coach.setBleeding(false);
        return this.#type(this.coach.tireKpa(), 2);
    }
  }

  async #readSupply({ keypad }: { keypad: boolean }): Promise<void> {
    if (keypad && this.#call !== 'read-supply' && this.#call !== 'check') return;
    this.#lastReading = this.coach.at;
    const shown = String(Math.round(this.coach.wheelGaugeKpa() / kpaPerPsi));
    const offered = this.page.locator('.gauge .key', { hasText: new RegExp(`^${shown}$`) });
    if (!keypad && (await offered.count()) > 0) return offered.first().click();
    if (!keypad) await this.#press('Other value');
    await this.#type(this.coach.wheelGaugeKpa(), 1);
  }

  /** Types the nearest mark of a gauge with `marks` to a psi. */
  async #type(kpa: number, marks: number): Promise<void> {
    const text = String(Math.round((kpa / kpaPerPsi) * marks) / marks);
    for (const digit of text) {
      await this.page
        .locator('.keypad-digits .key', { hasText: new RegExp(`^[${digit}]$`) })
        .click();
    }
    await this.#press('Enter');
  }

  async #press(name: string): Promise<void> {
    await this.page.getByRole('button', { name, exact: true }).first().click();
  }
}
