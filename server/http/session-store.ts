import connectPgSimple from 'connect-pg-simple';
import type { Request } from 'express';
import session, { type SessionData } from 'express-session';
import type pg from 'pg';
import type { SignedInAccount } from './signed-in';

const HOUR_MS = 3_600_000;
/** How long a session lasts without `stay`, from its last use. */
const IDLE_SECONDS = 24 * 3600;

interface SessionRow extends Omit<SignedInAccount, 'id'> {
  readonly sess: SessionData;
  readonly expire: Date;
  readonly id: string | null;
}

const PgSessionStore = connectPgSimple(session);

/**
 * Sessions in PostgreSQL. One query reads a session together with its account, so that a right
 * that was taken away is gone with the next request, and reading costs no write: a session that
 * is in use is prolonged once an hour.
 */
export class SessionStore extends PgSessionStore {
  readonly #rows = new WeakMap<object, SessionRow>();
  readonly #accounts = new WeakMap<object, SignedInAccount>();
  readonly #pool: pg.Pool;

  constructor(pool: pg.Pool, errorLog: (...entries: unknown[]) => void) {
    super({ pool, tableName: 'sessions', ttl: IDLE_SECONDS, errorLog });
    this.#pool = pool;
  }

  override get(
    sid: string,
    callback: (error: unknown, session?: SessionData | null) => void,
  ): void {
    this.#read(sid).then(
      (data) => {
        callback(null, data);
      },
      (error: unknown) => {
        callback(error);
      },
    );
  }

  override createSession(req: Request, data: SessionData): session.Session & SessionData {
    const created = super.createSession(req, data);
    const row = this.#rows.get(data);
    if (!row) return created;
    this.#rows.set(created, row);
    const { id, email, name, kind, createdAt } = row;
    if (id !== null) this.#accounts.set(req, { id, email, name, kind, createdAt });
    return created;
  }

  override touch(sid: string, data: SessionData, callback?: () => void): void {
    const lifeMs = data.cookie.originalMaxAge ?? IDLE_SECONDS * 1000;
    const expiresMs = this.#rows.get(data)?.expire.getTime() ?? 0;
    if (expiresMs > Date.now() + lifeMs - HOUR_MS) callback?.();
    else super.touch(sid, data, callback);
  }

  /** The account that was read with the session of this request. */
  accountOf(req: object): SignedInAccount | undefined {
    return this.#accounts.get(req);
  }

  async #read(sid: string): Promise<SessionData | null> {
    const { rows } = await this.#pool.query<SessionRow>(
      `SELECT sessions.sess, sessions.expire, accounts.id, accounts.email, accounts.name,
              accounts.kind, accounts.created_at AS "createdAt"
         FROM sessions LEFT JOIN accounts ON accounts.id = sessions.account_id
        WHERE sessions.sid = $1 AND sessions.expire > now()`,
      [sid],
    );
    const [row] = rows;
    if (!row) return null;
    this.#rows.set(row.sess, row);
    return row.sess;
  }
}
