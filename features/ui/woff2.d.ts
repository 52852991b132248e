declare module '*.woff2' {
  /** Number under which the bundler registers the file. */
  const file: number;
  export = file;
}
