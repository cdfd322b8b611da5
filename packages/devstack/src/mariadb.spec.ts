import { serverFlags } from './mariadb.mjs';

const places = { data: '/d', run: '/r', socket: '/r/s', port: 4620, setup: '/r/setup.sql' };

describe('the settings of the database', () => {
  it('keep it off the network and free of the settings of the machine', () => {
    const flags = serverFlags({ ...places, isDurable: true });
    expect(flags[0]).toBe('--no-defaults');
    expect(flags).toContain('--bind-address=127.0.0.1');
    expect(flags).toContain('--port=4620');
  });

  it('lose no committed money, and let no update overwrite another one unseen', () => {
    const flags = serverFlags({ ...places, isDurable: true });
    expect(flags).toContain('--innodb-flush-log-at-trx-commit=1');
    expect(flags).toContain('--innodb-snapshot-isolation=ON');
    expect(serverFlags({ ...places, isDurable: false })).toContain('--innodb-snapshot-isolation=ON');
  });
});
