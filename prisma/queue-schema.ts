/** Schema of the queue's tables. */
export const QUEUE_SCHEMA = 'pgboss';
