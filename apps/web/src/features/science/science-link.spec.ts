import { scienceLink } from './science-link';

describe('scienceLink()', () => {
  it('leads from page to page inside the application', () => {
    expect(['pulses.md', './marking-time.md', 'beam.md#validity'].map(scienceLink)).toEqual([
      '/science/pulses',
      '/science/marking-time',
      '/science/beam',
    ]);
  });

  it('leads to the index', () => {
    expect(scienceLink('README.md')).toBe('/science');
  });

  it('leads nowhere for what the application does not show', () => {
    expect(['../adr/0001-entered-values-are-the-record.md', 'https://example.org/x.md', undefined].map(scienceLink)).toEqual([
      undefined,
      undefined,
      undefined,
    ]);
  });
});
