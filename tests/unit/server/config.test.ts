import { ConfigError, parseConfig } from '@/server/config'

describe('the configuration', () => {
  it('needs nothing set for the demo', () => {
    expect(parseConfig({})).toMatchObject({
      port: 8080,
      publicUrl: 'http://localhost:8080',
      allowedOrigins: ['http://localhost:8080'],
      isDemo: true,
      databaseUrl: null,
      authSecret: null,
      trustedProxies: 0,
    })
  })

  it('takes an empty line for one that is not there', () => {
    expect(parseConfig({ PORT: '', DATABASE_URL: '', AUTH_SECRET: '' })).toMatchObject({
      port: 8080,
      databaseUrl: null,
    })
  })

  it('is no demo in production, and then names what it needs', () => {
    expect(() => parseConfig({ NODE_ENV: 'production' })).toThrow(/PUBLIC_URL, RESEND_API_KEY, ADMIN_EMAIL/)
    const config = parseConfig({
      NODE_ENV: 'production',
      PUBLIC_URL: 'https://school.example/',
      RESEND_API_KEY: 're_x',
      ADMIN_EMAIL: 'head@school.example',
    })
    expect(config).toMatchObject({ isDemo: false, publicUrl: 'https://school.example' })
  })

  it.each([
    ['PORT', 'eighty'],
    ['PORT', '70000'],
    ['PUBLIC_URL', 'school.example'],
    ['PUBLIC_URL', 'javascript:alert(1)'],
    ['AUTH_SECRET', 'short'],
    ['DEMO', 'yes'],
    ['TRUST_PROXY', '-1'],
    ['LOG_LEVEL', 'loud'],
    ['ADMIN_EMAIL', 'nobody'],
    ['ALLOWED_ORIGINS', 'http://a.example, b.example'],
  ])('says that %s cannot be %s', (name, value) => {
    expect(() => parseConfig({ [name]: value })).toThrow(ConfigError)
    expect(() => parseConfig({ [name]: value })).toThrow(name)
  })
})
