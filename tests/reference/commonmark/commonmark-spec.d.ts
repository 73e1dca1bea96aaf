declare module 'commonmark-spec' {
  const spec: { text: string; tests: { number: number; section: string; markdown: string; html: string }[] };
  export default spec;
}
