/** A JSON pointer (RFC 6901) as a field's path: "/chemistry/C" is "chemistry.C". */
export function pathOfPointer(pointer: string): string {
  return pointer
    .split("/")
    .slice(1)
    .map((step) => step.replaceAll("~1", "/").replaceAll("~0", "~"))
    .join(".");
}
