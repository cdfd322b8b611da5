/** Whether this browser draws in three dimensions; asked before the program for it is fetched. */
export function hasWebGl(): boolean {
  try {
    const context = document.createElement('canvas').getContext('webgl2');
    // Browsers keep few contexts; this one was only a question.
    context?.getExtension('WEBGL_lose_context')?.loseContext();
    return context !== null;
  } catch {
    return false;
  }
}
