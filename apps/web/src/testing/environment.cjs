// What jsdom lacks is lent to it from Node: the deep copy, and fetch with the classes that belong together.
const jsdom = require('jest-environment-jsdom');

const LENT = [
  'structuredClone',
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
