import type { Options } from './options';

export async function printSpeed(options: Options): Promise<void> {
  console.log(options.coaches);
}
