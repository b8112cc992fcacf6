/** The builder hands an imported SVG over as its text (`loader` in angular.json). */
declare module '*.svg' {
  const text: string;
  export default text;
}
