export const cautionTexts = {
  title: 'Cautions',
  lead: 'Building an instrument is a pleasure with hot, sharp and stretched things in it. Each kit adds its own cautions to these.',
  groups: [
    {
      name: 'Printing',
      lines: [
        'Melted plastic gives off fumes and very fine particles. Air the room, and do not sleep beside a running printer.',
        'Nozzle and bed burn the skin, for minutes after the print has ended.',
        'Do not leave a printer running alone. Keep it on a surface that does not burn, with a smoke alarm in the room.',
      ],
    },
    {
      name: 'Making',
      lines: [
        'Cut away from yourself and drill with the part clamped.',
        'Sanding dust does not belong in the lungs: sand wet, or wear a mask.',
        'Read what is written on the glue, and use it with the window open.',
        'Stretched bands and strings fly when they break. Wear eye protection while you stretch them.',
      ],
    },
    {
      name: 'Playing',
      lines: [
        'Layer lines hold germs. Wash mouthpieces, do not share them, and do not take printed plastic for food-safe unless it was made so.',
        'Small parts can be swallowed: not for children under three.',
        'Some instruments are loud close to the ear. Play them at arm’s length.',
      ],
    },
    {
      name: 'Selling what you print',
      lines: [
        'A licence that lets you sell prints does not settle the law of your country on toys, product safety and consumers. Ask a licensed professional there.',
        'The same goes for tax.',
      ],
    },
  ],
};
