/** A style sheet as text, for the specs that check it: `import tokens from './tokens.css' with { loader: 'text' }`. */
declare module '*.css' {
  const text: string;
  export default text;
}
