/**
 * Loaded before the app server with `--import`: when the command that started the server is killed
 * outright, its end of this pipe closes, and the server stops too instead of keeping the port.
 */
import { isMainThread } from 'node:worker_threads';

if (isMainThread) {
  process.stdin.on('error', () => {});
  process.stdin.on('close', () => process.kill(process.pid, 'SIGTERM'));
  process.stdin.resume();
  process.stdin.unref();
}
