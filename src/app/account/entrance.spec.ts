import { localPath } from './entrance';

describe('localPath', () => {
  it('takes addresses of this application', () => {
    expect(localPath('/designs/d1?x=1')).toBe('/designs/d1?x=1');
    expect(localPath('/')).toBe('/');
  });

  it('takes no address that leads elsewhere', () => {
    for (const to of [
      '//elsewhere.example',
      '/\\elsewhere.example',
      'https://elsewhere.example',
      '',
      undefined,
    ]) {
      expect(localPath(to)).withContext(String(to)).toBeUndefined();
    }
  });
});
