import fs from 'node:fs';
import inspector from 'node:inspector';
import path from 'node:path';
import { isMainThread } from 'node:worker_threads';

/*
 * Loaded into the server with --import: writes a CPU profile when the process ends. Node's own switch for
 * this may not stand in NODE_OPTIONS, and the server's command line belongs to the product.
 */

if (isMainThread) {
  const session = new inspector.Session();
  session.connect();
  session.post('Profiler.enable');
  session.post('Profiler.start');
  process.on('exit', () => {
    session.post('Profiler.stop', (error, result) => {
      if (error) return;
      const file = path.join(String(process.env.BENCH_PROFILE_DIR), `${process.pid}.cpuprofile`);
      fs.writeFileSync(file, JSON.stringify(result.profile));
    });
  });
}
