/** Two clocks at once: wall time, and what the processor spent on this process. */
export interface Clock {
  wall: number;
  cpu: NodeJS.CpuUsage;
}

export function startClock(): Clock {
  return { wall: performance.now(), cpu: process.cpuUsage() };
}

/**
 * Milliseconds since: the lesser of both clocks. Others share the machine, so wall time counts
 * what they took; the processor's count takes in compiler and collector threads beside.
 */
export function readClock({ wall, cpu }: Clock): number {
  const spent = process.cpuUsage(cpu);
  return Math.min(performance.now() - wall, (spent.user + spent.system) / 1000);
}
