import { sep } from 'node:path';
import sequencerModule from '@jest/test-sequencer';

const Sequencer = sequencerModule.default ?? sequencerModule;

// Files that start whole processes take longest: started first, they do not keep one worker busy at the end of a run.
const long = ['commands/sigkill-api', 'demo/', 'jobs/worker', 'prisma/', 'platform/embedded', 'commands/', 'http/'];

export default class LongFirst extends Sequencer {
  sort(tests) {
    const rank = ({ path }) => {
      const place = long.findIndex((part) => path.split(sep).join('/').includes(`/test/${part}`));
      return place === -1 ? long.length : place;
    };
    return [...tests].sort((a, b) => rank(a) - rank(b) || (a.path < b.path ? -1 : 1));
  }
}
