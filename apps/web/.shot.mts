import { chromium } from '@playwright/test';
const [url, out, width='1280', scheme='light', full='1'] = process.argv.slice(2);
const b = await chromium.launch({executablePath:'/usr/bin/chromium', args:['--no-sandbox','--disable-dev-shm-usage','--disable-background-networking','--no-first-run']});
const p = await b.newPage({viewport:{width:+width,height:900}, colorScheme: scheme as any});
p.on('console', m=>{ if(m.type()==='error') console.log('console:', m.text()); });
await p.goto(url,{waitUntil:'networkidle'}); await p.waitForTimeout(500);
await p.screenshot({path:out, fullPage: full==='1'}); await b.close();
