/** Prints "N passed, N failed" alone as the very last line of a run. */
export default class LastLine {
  onRunComplete(_contexts, results) {
    const failed = results.numFailedTests + results.numRuntimeErrorTestSuites;
    process.on('exit', () => process.stdout.write(`${results.numPassedTests} passed, ${failed} failed\n`));
  }
}
