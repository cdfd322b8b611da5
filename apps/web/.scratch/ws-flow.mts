import { base, kit, launch, makeState, mock, rev } from './ws-mock.mts';
import { createHash } from 'node:crypto';
const b = await launch(); const p = await b.newPage({ viewport: { width: 1280, height: 900 } });
p.on('console', (m) => m.type() === 'error' && console.log('console', m.text().slice(0, 200))); p.on('pageerror', (e) => console.log('ERR', e.message));
const state = makeState(); state.failNext.add('P-95 c.stl'); state.refuse.add('P-96 d.stl');
const buf = (n: number) => Buffer.alloc(n * 100_000, n);
state.stored.add(createHash('sha256').update(buf(1)).digest('hex'));
await mock(p, state); await p.goto(base + rev); await p.getByRole('heading', { level: 1 }).waitFor({ timeout: 30000 });
const input = p.getByLabel('choose files'); await input.waitFor({ state: 'attached', timeout: 20000 });
await input.setInputFiles(['P-93 a.stl', 'P-94 b.stl', 'P-95 c.stl', 'P-96 d.stl', 'setup.exe', 'P-97 e.stl', 'P-98 f.stl'].map((name, i) => ({ name, mimeType: 'model/stl', buffer: buf(i + 1) })));
await p.waitForTimeout(900); console.log('mid:', (await p.getByRole('region', { name: 'Upload' }).innerText()).replace(/\n+/g, ' | '));
await p.screenshot({ path: '/tmp/ws/upload-mid.png' });
console.log('asks on leave:', await p.evaluate(() => { const e = new Event('beforeunload', { cancelable: true }); window.dispatchEvent(e); return e.defaultPrevented; }));
await p.getByText(/Finished/).waitFor({ timeout: 30000 }); await p.waitForTimeout(3500);
console.log('end:', (await p.getByRole('region', { name: 'Upload' }).innerText()).replace(/\n+/g, ' | '));
await p.screenshot({ path: '/tmp/ws/upload-end.png' });
console.log('asks on leave:', await p.evaluate(() => { const e = new Event('beforeunload', { cancelable: true }); window.dispatchEvent(e); return e.defaultPrevented; }));
console.log(state.log.filter((l) => /POST/.test(l)).join(', '));
await p.getByRole('button', { name: 'Try P-95 c.stl again' }).click(); await p.waitForTimeout(3500);
console.log('retried:', (await p.getByRole('region', { name: 'Upload' }).innerText()).replace(/\n+/g, ' | ').slice(0, 300));
// marks
await p.getByLabel('What buyers should do about R-01').selectOption('reprint if it troubles you');
await p.getByLabel('Reason to reprint R-01').fill('The lip sinks'); await p.getByLabel('Reason to reprint R-01').blur(); await p.waitForTimeout(400);
console.log(JSON.stringify(state.comparison.rows.find((r) => r.code === 'R-01')));
// part dialog
await p.getByRole('button', { name: 'Edit P-72' }).click(); const d = p.getByRole('dialog'); await d.getByLabel('Sounding length').fill(''); await d.getByLabel('Name').fill('Pipe C5, long'); await d.getByRole('button', { name: 'Save the part' }).click(); await p.waitForTimeout(800);
await p.screenshot({ path: '/tmp/ws/part-dialog.png' }); console.log('fault:', await d.getByText('Write a number.').count());
await d.getByLabel('Sounding length').fill('160'); await d.getByRole('button', { name: 'Save the part' }).click(); await d.waitFor({ state: 'hidden' });
console.log(JSON.stringify(state.rev.parts.find((q: any) => q.code === 'P-72').voice), await p.getByText('Pipe C5, long').count());
// change notes
await p.getByRole('link', { name: 'Change notes' }).click(); await p.getByRole('button', { name: 'Fixed', exact: true }).click(); await p.waitForTimeout(200);
await p.keyboard.type('Tongue '); await p.getByLabel('Part', { exact: true }).selectOption('J-01'); await p.getByRole('button', { name: 'Insert the part' }).click(); await p.waitForTimeout(300); await p.keyboard.type(' is narrower.');
console.log(JSON.stringify(await p.getByRole('textbox', { name: 'Change notes' }).inputValue()));
await p.reload(); await p.getByText('were not saved last time').waitFor({ timeout: 20000 }); console.log('kept over a reload');
await p.screenshot({ path: '/tmp/ws/changes-typed.png' });
await p.getByRole('button', { name: 'Save the change notes' }).click(); await p.getByText('Saved.').waitFor(); console.log(JSON.stringify(state.rev.changeNotes));
// spec
await p.getByRole('link', { name: 'Print specification' }).click(); await p.getByRole('button', { name: 'Insert the usual cautions' }).click(); await p.getByRole('spinbutton', { name: 'Infill' }).fill('20'); await p.getByRole('button', { name: 'Add a row' }).click(); await p.getByRole('button', { name: 'Save the specification' }).click(); await p.waitForTimeout(500);
console.log('faulty row:', await p.getByText('Fill this in.').count()); await p.getByRole('group', { name: 'Row 3' }).getByLabel('Thing').fill('Felt'); await p.getByRole('button', { name: 'Save the specification' }).click(); await p.getByText('Saved', { exact: true }).waitFor();
console.log(state.rev.printSpec.infill, state.rev.cautions.length, state.rev.hardware.length);
// release
for (const g of state.rev.gates) if (g.state === 'open') g.state = 'passed';
await p.getByRole('link', { name: 'Parts' }).click(); await p.reload(); await p.getByRole('button', { name: 'Release Mk 1.5' }).click({ timeout: 20000 }); await p.waitForTimeout(300); await p.screenshot({ path: '/tmp/ws/release-ask.png' });
await p.getByRole('dialog').getByRole('button', { name: 'Release Mk 1.5' }).click(); await p.getByText('Building the bundle').waitFor(); await p.screenshot({ path: '/tmp/ws/release-building.png' });
await p.getByText('Mk 1.5 was released on').waitFor({ timeout: 20000 }); await p.waitForTimeout(800); await p.screenshot({ path: '/tmp/ws/release-done.png' }); console.log('released');
await b.close();
