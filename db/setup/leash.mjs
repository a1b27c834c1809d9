/**
 * Loaded before the app server with `--import`: when the command that started the server is killed
 * outright, its end of this pipe closes, and the server stops too instead of keeping the port.
 */
import { isMainThread } from 'node:worker_threads';

/** For answers that are under way. */
const GRACE_MS = 5000;

if (isMainThread) {
  process.stdin.on('error', () => {});
  process.stdin.on('close', () => {
    process.kill(process.pid, 'SIGTERM');
    setTimeout(() => process.exit(1), GRACE_MS).unref();
  });
  process.stdin.resume();
  process.stdin.unref();
}
