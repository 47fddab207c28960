declare module 'jstat' {
  const jstat: {
    triangular: { pdf(x: number, minimum: number, maximum: number, mode: number): number };
  };
  export default jstat;
}
