// CommonJS because Karma loads its configuration with require().
const { existsSync } = require('node:fs');

process.env.CHROME_BIN ??= ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'].find(
  existsSync,
);

module.exports = (config) =>
  config.set({
    frameworks: ['jasmine'],
    plugins: [require('karma-jasmine'), require('karma-chrome-launcher')],
    client: { jasmine: { random: true, seed: '20260', timeoutInterval: 60_000 } },
    reporters: ['progress'],
    browsers: ['Chromium'],
    customLaunchers: {
      Chromium: {
        base: 'ChromeHeadless',
        flags: [
          '--no-sandbox',
          '--disable-gpu',
          '--disable-quic',
          '--no-first-run',
          '--disable-background-networking',
          '--disable-component-update',
          '--disable-sync',
        ],
      },
    },
    // A property spec may keep the page's thread busy for longer than the usual five seconds.
    pingTimeout: 120_000,
    browserDisconnectTimeout: 60_000,
    browserNoActivityTimeout: 300_000,
    restartOnFileChange: false,
  });
