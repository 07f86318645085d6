// jsdom has no fetch; the one of Node is lent to it, with the classes that belong together.
const jsdom = require('jest-environment-jsdom');

const LENT = [
  'fetch',
  'Request',
  'Response',
  'Headers',
  'AbortController',
  'AbortSignal',
  'TextEncoder',
  'TextDecoder',
  'ReadableStream',
  'TransformStream',
];

module.exports = class WebEnvironment extends jsdom.default {
  async setup() {
    await super.setup();
    for (const name of LENT) this.global[name] = globalThis[name];
  }
};
