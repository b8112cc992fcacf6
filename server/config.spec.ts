import { resolve } from 'node:path';
import { ConfigError, configFrom } from './config.js';

describe('configFrom', () => {
  it('needs nothing', () => {
    expect(configFrom({})).toEqual(
      jasmine.objectContaining({
        port: 4210,
        host: '127.0.0.1',
        dataFolder: resolve('data'),
        publicOrigin: null,
        sessionSecret: null,
        hasDemo: true,
        logLevel: 'info',
        trustedProxies: 0,
      }),
    );
    expect(configFrom({ PORT: '', HOST: ' ', SEED_DEMO: '' })).toEqual(configFrom({}));
  });

  it('takes what is given', () => {
    const config = configFrom({
      PORT: '0',
      HOST: '::1',
      DATA_DIR: 'elsewhere',
      PUBLIC_URL: 'https://forge.example/',
      SESSION_SECRET: 'x'.repeat(32),
      SEED_DEMO: '0',
      LOG_LEVEL: 'warn',
    });

    expect(config).toEqual(
      jasmine.objectContaining({
        port: 0,
        host: '::1',
        dataFolder: resolve('elsewhere'),
        publicOrigin: 'https://forge.example',
        sessionSecret: 'x'.repeat(32),
        hasDemo: false,
        logLevel: 'warn',
        trustedProxies: 1,
      }),
    );
    expect(configFrom({ PUBLIC_URL: 'https://forge.example', TRUST_PROXY: '2' }).trustedProxies).toBe(2);
  });

  const wrong: readonly (readonly [variable: string, value: string])[] = [
    ['PORT', 'http'],
    ['PORT', '65536'],
    ['PORT', '-1'],
    ['PORT', '80.5'],
    ['HOST', 'two words'],
    ['PUBLIC_URL', 'forge.example'],
    ['PUBLIC_URL', 'ftp://forge.example'],
    ['PUBLIC_URL', 'https://forge.example/path'],
    ['PUBLIC_URL', 'https://user@forge.example'],
    ['SESSION_SECRET', 'short secret'],
    ['SEED_DEMO', 'yes'],
    ['LOG_LEVEL', 'loud'],
    ['TRUST_PROXY', 'all'],
  ];

  for (const [variable, value] of wrong) {
    it(`names ${variable} when it is ${value}`, () => {
      expect(() => configFrom({ [variable]: value })).toThrowError(
        ConfigError,
        new RegExp(`^${variable} is `),
      );
    });
  }

  it('does not repeat a secret', () => {
    expect(() => configFrom({ SESSION_SECRET: 'short secret' })).toThrowError(/^((?!short secret).)*$/);
  });
});
