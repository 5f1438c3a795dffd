/** `… | head` closes the pipe when it has enough: that ends a command quietly, with the exit code it has so far. */
export function endWithoutReader(): void {
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code !== 'EPIPE') throw error;
    process.exit();
  });
}
