import { ConfigRefused, readConfig } from './config';

const refusal = (environment: NodeJS.ProcessEnv): string => {
  try {
    readConfig(environment);
  } catch (error) {
    if (error instanceof ConfigRefused) return error.message;
    throw error;
  }
  return 'taken';
};

const BUCKET = {
  UNDERSEAM_S3_ENDPOINT: 'https://s3.example.org',
  UNDERSEAM_S3_BUCKET: 'photos',
  UNDERSEAM_S3_REGION: 'local',
  UNDERSEAM_S3_KEY_ID: 'id',
  UNDERSEAM_S3_SECRET: 'words',
};

describe('readConfig', () => {
  it('given nothing, or only empty variables, has every default', () => {
    const defaults = {
      port: 4310,
      data: './data',
      demo: true,
      secret: undefined,
      smtpUrl: undefined,
      now: undefined,
      publicUrl: 'http://localhost:4310',
      production: false,
    };
    expect(readConfig({})).toEqual(defaults);
    expect(readConfig({ PORT: '', UNDERSEAM_DATA: '', SMTP_URL: '' })).toEqual(defaults);
  });

  it('given a fixed moment in any of its spellings, takes that instant', () => {
    for (const [text, instant] of [
      ['2026-02-02T06:30:00Z', '2026-02-02T06:30:00.000Z'],
      ['2026-02-02T07:30:00.5+01:00', '2026-02-02T06:30:00.500Z'],
      ['2026-02-02T06:30Z', '2026-02-02T06:30:00.000Z'],
    ]) {
      expect(readConfig({ UNDERSEAM_NOW: text }).now?.toISOString()).toBe(instant);
    }
  });

  it.each([
    [{ PORT: 'eighty' }, /PORT must be/],
    [{ PORT: '65536' }, /PORT must be/],
    [{ PORT: '-1' }, /PORT must be/],
    [{ PORT: '80.5' }, /PORT must be/],
    [{ UNDERSEAM_NOW: 'yesterday' }, /UNDERSEAM_NOW must be/],
    [{ UNDERSEAM_NOW: '1' }, /UNDERSEAM_NOW must be/],
    [{ UNDERSEAM_NOW: '2026-02-30T00:00:00Z' }, /UNDERSEAM_NOW must be/],
    [{ UNDERSEAM_NOW: '2026-02-02T06:30:00Z', NODE_ENV: 'production' }, /refused when NODE_ENV/],
    [{ UNDERSEAM_SECRET: 'short' }, /UNDERSEAM_SECRET must have/],
    [{ SMTP_URL: 'mailserver' }, /SMTP_URL must look/],
    [{ SMTP_URL: 'http://mail.example' }, /SMTP_URL must look/],
    [{ UNDERSEAM_DEMO: 'maybe' }, /UNDERSEAM_DEMO must be/],
    [{ UNDERSEAM_URL: 'not an address' }, /UNDERSEAM_URL must be/],
  ])('given %j, refuses it in one sentence', (environment, pattern) => {
    expect(refusal(environment)).toMatch(pattern);
    expect(refusal(environment)).not.toContain('\n');
  });

  it('given every setting of a bucket for photos, takes them', () => {
    expect(readConfig(BUCKET).bucket).toEqual({
      endpoint: 'https://s3.example.org',
      bucket: 'photos',
      region: 'local',
      keyId: 'id',
      secret: 'words',
    });
  });

  it('given some settings of a bucket only, names those that are missing', () => {
    const { UNDERSEAM_S3_REGION: _region, UNDERSEAM_S3_KEY_ID: _id, ...some } = BUCKET;
    expect(refusal(some)).toMatch(/UNDERSEAM_S3_REGION, UNDERSEAM_S3_KEY_ID too\.$/);
    expect(refusal(some)).not.toContain('words');
  });

  it.each(['not an address', 'ftp://s3.example.org'])(
    'given a bucket at %s, refuses the address',
    (endpoint) => {
      expect(refusal({ ...BUCKET, UNDERSEAM_S3_ENDPOINT: endpoint })).toMatch(
        /UNDERSEAM_S3_ENDPOINT must be/,
      );
    },
  );

  it('given several bad settings, names every one', () => {
    expect(refusal({ PORT: 'x', UNDERSEAM_DEMO: 'x', SMTP_URL: 'x' })).toMatch(
      /PORT .*UNDERSEAM_DEMO .*SMTP_URL/,
    );
  });
});
