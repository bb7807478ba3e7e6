/** SVG files are bundled as their text (angular.json, `loader`). */
declare module '*.svg' {
  const text: string;
  export default text;
}
