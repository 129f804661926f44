import { expect, test } from 'vitest';
import { connectionOptions, readDatabaseUrl } from '#server/db/access';

test('when the database is on another machine, then it is reached with verified TLS only', () => {
  const { ssl } = connectionOptions(readDatabaseUrl('mariadb://a:b@db.example/silt'));
  expect(ssl).toMatchObject({ rejectUnauthorized: true, minVersion: 'TLSv1.2' });
});

test.each(['mysql://a:b@localhost/silt', 'mysql://a:b@127.0.0.1:3307/silt', 'mysql://a:b@[::1]/silt'])(
  'when the database is %s, then it is reached on this machine without TLS',
  (url) => {
    expect(connectionOptions(readDatabaseUrl(url)).ssl).toBeUndefined();
  },
);

test('when a socket is named, then it stands in for host and port', () => {
  const access = readDatabaseUrl('mysql://a:b@localhost/silt?socketPath=/run/mysqld/mysqld.sock');
  expect(access).toEqual({
    user: 'a',
    password: 'b',
    database: 'silt',
    socketPath: '/run/mysqld/mysqld.sock',
  });
});
