// The package's main file is a UMD bundle that Node loads as an empty module; this file is the working one.
declare module "svg2pdf.js/dist/svg2pdf.es.min.js" {
  export * from "svg2pdf.js";
}
