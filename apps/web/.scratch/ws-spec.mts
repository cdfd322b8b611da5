import { base, launch, makeState, mock, rev } from './ws-mock.mts';
const b = await launch(); const p = await b.newPage({ viewport: { width: 1280, height: 900 } });
const state = makeState(); await mock(p, state); await p.goto(base + rev + '/specification');
await p.getByRole('button', { name: 'Add a row' }).click({ timeout: 30000 }); await p.getByRole('button', { name: 'Save the specification' }).click(); await p.waitForTimeout(500);
await p.getByRole('group', { name: 'Row 3' }).getByLabel('Thing').fill('Felt'); await p.getByRole('button', { name: 'Save the specification' }).click(); await p.waitForTimeout(1500);
console.log(state.log.filter((l) => /PATCH/.test(l))); console.log(await p.locator('form').innerText().then((t) => t.slice(-300)));
await p.locator('form').screenshot({ path: '/tmp/ws/spec-err.png' });
await b.close();
