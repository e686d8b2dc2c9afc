/** Texts that try to become something else than text; each appears in the manifest of `hostileManifest`. */
export const hostileTexts = {
  script: '<script>document.title = "taken"</script>',
  image: '"><img src=x onerror="document.title=\'taken\'">',
  drawing: '</text></svg><script>document.title = "taken"</script>',
  link: '[click](javascript:alert(1)) ![](https://data.northmere.example/x.png) https://www.northmere.example',
  table: 'a | b `c` **d** _e_ <!-- f --> &lt;g&gt;',
  longWord: 'x'.repeat(3000),
} as const;

/** Moves the cursor, colours a terminal, turns the direction of text round. */
export const controls = 'a\u001b[31mb\u202ec\u0000d\u0085e';

/** The example's manifest with hostile texts wherever a page shows some; its seals no longer hold. */
export function hostileManifest(manifest: string): string {
  const { script, image, drawing, link, table, longWord } = hostileTexts;
  const changes: readonly (readonly [string | RegExp, string])[] = [
    [/^ {2}title: Fennock.*$/m, `  title: ${JSON.stringify(script)}`],
    [/^ {2}purpose: .*$/m, `  purpose: ${JSON.stringify(image)}`],
    [/^ {2}decision: .*$/m, `  decision: ${JSON.stringify(link)}`],
    [/^ {2}name: Fennock.*$/m, `  name: ${JSON.stringify(table)}`],
    [/gaps_treated: Left missing.*$/m, `gaps_treated: ${JSON.stringify(longWord)}`],
    [/because: weed in the channel.*$/m, `because: ${JSON.stringify(controls)}`],
    ['water supply: supply_mm', `${JSON.stringify(drawing)}: supply_mm`],
    ['name: snow_threshold\n', `name: ${JSON.stringify(image)}\n`],
    ['title: Gauged daily mean flow at Old Mill', `title: ${JSON.stringify(longWord)}`],
    [/says: Two summer storms.*$/m, `says: ${JSON.stringify(`${drawing}\n# no heading\n\n- no list`)}`],
  ];
  return changes.reduce((text, [from, to]) => {
    const changed = text.replace(from, () => to);
    if (changed === text) throw new Error(`the manifest has no ${from}`);
    return changed;
  }, manifest);
}
