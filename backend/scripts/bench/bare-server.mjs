import express from 'express';
import mysql from 'mysql2/promise';

/*
 * What the product's way of saving an entry is measured against: the same stack with nothing on top. It
 * takes the same requests, asks nobody who they are, checks and works out nothing, and writes one row of an
 * entry's size and one counter in a transaction.
 */

/** About what the server adds to an entry. */
const SERVER_PART = JSON.stringify({ position: 1, judgement: { figures: 'x'.repeat(330) } });
const HASH = 'a'.repeat(64);

const pool = mysql.createPool({
  host: process.env.BENCH_HOST,
  port: Number(process.env.BENCH_PORT),
  user: process.env.BENCH_USER,
  password: process.env.BENCH_PASSWORD,
  database: process.env.BENCH_DATABASE,
  timezone: 'Z',
  connectionLimit: 16,
});

const app = express();
app.post('/entries', express.json({ limit: '2mb' }), async (request, response) => {
  const [{ body, bodyHash }] = request.body.entries;
  const connection = await pool.getConnection();
  try {
    await connection.beginTransaction();
    await connection.query(
      `INSERT INTO bare_entry (id, sequence_id, author_id, device_id, device_count, received_at, body, body_hash,
         server_part, previous_hash, hash) VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)`,
      [
        body.id,
        body.sequenceId,
        body.authorId,
        body.deviceId,
        body.deviceCount,
        new Date(),
        JSON.stringify(body),
        bodyHash,
        SERVER_PART,
        HASH,
        HASH,
      ],
    );
    await connection.query(
      'UPDATE bare_sequence SET head_position = head_position + 1, head_hash = ? WHERE id = ?',
      [bodyHash, body.sequenceId],
    );
    await connection.commit();
  } catch (error) {
    await connection.rollback();
    throw error;
  } finally {
    connection.release();
  }
  response.json({ id: body.id });
});

const server = app.listen(0, '127.0.0.1', () => {
  const { port } = /** @type {import('node:net').AddressInfo} */ (server.address());
  process.send?.({ port });
});
process.on('SIGTERM', () => process.exit(0));
process.on('disconnect', () => process.exit(0));
