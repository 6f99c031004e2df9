/** Name of a slice after another word: "pre-industrial", "mid-Holocene"; proper names keep their capitals. */
export const sliceWithin = (name: string) =>
  name.replace(/^(Pre|Mid|Present)(?=-)/, (word) => word.toLowerCase());

/** Name of a slice as the owner of something: "the Last Glacial Maximum", "Marine Isotope Stage 3", "pre-industrial time". */
export function sliceWithArticle(name: string): string {
  const within = sliceWithin(name);
  if (/^(pre|present)-/.test(within)) return `${within} time`;
  return /^(the|MIS|Stage|Marine Isotope Stage)\b/i.test(within) ? within : `the ${within}`;
}
