interface Alarm {
  due: number;
  ring: () => void;
  timer: NodeJS.Timeout | undefined;
}

/** setTimeout cannot wait longer than 2^31 - 1 ms; a longer wait is taken in stretches. */
const LONGEST_WAIT_MS = 2_147_483_647;

/** The stand-in's own time: the machine's, plus what a test has added. UTC ms. */
export class Clock {
  private readonly alarms = new Set<Alarm>();

  constructor(public ahead = 0) {}

  now(): number {
    return Date.now() + this.ahead;
  }

  seconds(): number {
    return Math.floor(this.now() / 1000);
  }

  at(due: number, ring: () => void): void {
    const alarm: Alarm = { due, ring, timer: undefined };
    this.alarms.add(alarm);
    this.wind(alarm);
  }

  /** Goes through every alarm on the way, each at its own minute, so that what it writes is dated right. */
  advance(ms: number): void {
    const target = this.now() + ms;
    for (let next = this.earliest(); next && next.due <= target; next = this.earliest()) {
      this.ahead = Math.max(this.ahead, next.due - Date.now());
      this.ring(next);
    }
    this.ahead = Math.max(this.ahead, target - Date.now());
  }

  stop(): void {
    for (const alarm of this.alarms) clearTimeout(alarm.timer);
    this.alarms.clear();
  }

  private earliest(): Alarm | undefined {
    return [...this.alarms].sort((a, b) => a.due - b.due)[0];
  }

  private wind(alarm: Alarm): void {
    const wait = Math.min(Math.max(alarm.due - this.now(), 0), LONGEST_WAIT_MS);
    alarm.timer = setTimeout(() => (alarm.due <= this.now() ? this.ring(alarm) : this.wind(alarm)), wait);
    alarm.timer.unref();
  }

  private ring(alarm: Alarm): void {
    clearTimeout(alarm.timer);
    if (this.alarms.delete(alarm)) alarm.ring();
  }
}
