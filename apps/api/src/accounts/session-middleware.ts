import connectSessionSequelize from 'connect-session-sequelize';
import type { RequestHandler } from 'express';
import session from 'express-session';
import type { Sequelize } from 'sequelize';
import type { Config } from '../config/config.js';

const DAY_MS = 86_400_000;
const LIFE_MS = 14 * DAY_MS;

interface SessionFacts {
  passport?: { user?: string };
  cookie: { expires?: Date | string | null };
}

/**
 * Sessions in the database. A visitor who only looks gets no cookie. A session in use is prolonged at
 * most once a day, not by a write on each request.
 */
export const sessions = (config: Config, database: Sequelize): RequestHandler[] => {
  const Store = connectSessionSequelize(session.Store);
  // The package knows `disableTouch`, its types do not.
  const options: ConstructorParameters<typeof Store>[0] & { disableTouch: true } = {
    db: database,
    table: 'SessionRecord',
    disableTouch: true,
    expiration: LIFE_MS,
    checkExpirationInterval: -1,
    extendDefaultFields: (defaults: object, facts: SessionFacts) => ({
      ...defaults,
      personId: facts.passport?.user ?? null,
    }),
  };
  const store = new Store(options);
  return [
    session({
      name: 'windchest',
      secret: config.SESSION_SECRET,
      store,
      resave: false,
      saveUninitialized: false,
      proxy: true,
      cookie: {
        httpOnly: true,
        sameSite: 'lax',
        secure: config.BASE_URL.startsWith('https:'),
        maxAge: LIFE_MS,
        path: '/',
      },
    }),
    (request, _, next) => {
      const expires = request.session?.cookie.expires;
      if (
        request.session &&
        'passport' in request.session &&
        expires &&
        new Date(expires).getTime() - Date.now() < LIFE_MS - DAY_MS
      ) {
        request.session.cookie.maxAge = LIFE_MS;
        (request.session as { prolongedAt?: number }).prolongedAt = Date.now();
      }
      next();
    },
  ];
};
