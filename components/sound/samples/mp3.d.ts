/** The bundler answers an imported recording with the address it is served from. */
declare module '*.mp3' {
  const address: string
  // eslint-disable-next-line import-x/no-default-export -- the bundler's own form
  export default address
}
