import Sequencer from '@jest/test-sequencer';

/** Files that look at many pages go first: begun last, one of them would run alone at the end while the other browser waits. */
export default class LongestFirst extends Sequencer {
  sort(tests) {
    const sorted = super.sort(tests);
    const long = ({ path }) => /(pages-of|states-for)-/.test(path);
    return [...sorted.filter(long), ...sorted.filter((test) => !long(test))];
  }
}
