module.exports = (api) => {
  const isWeb = api.caller((caller) => caller?.platform === 'web')
  return { presets: ['babel-preset-expo'], plugins: isWeb ? ['./bundling/plain-rules.js'] : [] }
}
