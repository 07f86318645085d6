import { requestFingerprint } from './request-fingerprint';

const request = {
  method: 'POST',
  url: '/api/revisions/1/approve',
  body: { password: 'first', comment: 'good', nested: { newPassword: 'a' } },
};

test('another password makes no other fingerprint, at any depth', () => {
  const other = { ...request, body: { ...request.body, password: 'second', nested: { newPassword: 'b' } } };
  expect(requestFingerprint(other)).toBe(requestFingerprint(request));
});

test('another content, address or method makes another fingerprint', () => {
  const fingerprints = [
    request,
    { ...request, body: { ...request.body, comment: 'bad' } },
    { ...request, url: '/api/revisions/2/approve' },
    { ...request, method: 'PUT' },
  ].map(requestFingerprint);
  expect(new Set(fingerprints).size).toBe(4);
});
