import { chromium } from 'playwright';
const base = 'http://localhost:4100';
const b = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox','--disable-gpu','--disable-quic','--disable-background-networking'] });
async function as(user,w,h,dark,fn){ const ctx=await b.newContext({viewport:{width:w,height:h},colorScheme:dark?'dark':'light'}); const p=await ctx.newPage();
 p.on('console', m => { if (m.type()==='error') console.log(user,'console', m.text().slice(0,200)); }); p.on('pageerror', e => console.log('pageerror', e.message));
 await p.goto(base+'/sign-in'); await p.getByLabel(/mail/i).first().fill(user+'@example.org'); await p.getByLabel(/password/i).first().fill('lampstep-demo'); await p.getByRole('button',{name:/sign in/i}).click(); await p.waitForURL(/bench/); await p.waitForLoadState('networkidle');
 const shot=async n=>{await p.waitForTimeout(700); await p.screenshot({path:`/tmp/shots/x-${n}.png`});};
 await fn(p,shot); await ctx.close(); }
await as('senior',390,844,false,async(p,shot)=>{ await shot('senior-bench'); await p.screenshot({path:'/tmp/shots/x-senior-full.png',fullPage:true}); console.log((await p.locator('body').innerText()).slice(0,900)); });
await as('reviewer',1440,900,false,async(p,shot)=>{ await p.goto(base+'/records'); await p.waitForLoadState('networkidle'); await p.getByRole('link',{name:/corvane/i}).first().click(); await p.waitForURL(/records\/.+/); await p.waitForLoadState('networkidle'); await p.waitForTimeout(2500); await shot('record'); await p.screenshot({path:'/tmp/shots/x-record-full.png',fullPage:true}); });
await as('restorer',390,844,true,async(p,shot)=>{ await p.getByText(/16\/2093/).first().click(); await p.waitForURL(/bench\/.+/); await p.waitForTimeout(2500); await shot('run-dark'); console.log((await p.locator('body').innerText()).slice(0,900)); });
await b.close();
