import { openSync, readSync } from "node:fs";
import { scanReader } from "./app/lib/scan-reading/scan-reader.ts";
import { profilePoints } from "./app/lib/scan-reading/profile-points.ts";
import { fitProfile } from "./app/engine/profile/fit-profile.ts";
const cpu=()=>{const u=process.cpuUsage();return (u.user+u.system)/1e6};
for(let k=0;k<5;k++){
const s=cpu();
const r=scanReader("m.csv");
const fd=openSync("/tmp/sr/m.csv","r");const b=new Uint8Array(256*1024);let n;
while((n=readSync(fd,b,0,b.length,null))>0) r.push(b.subarray(0,n));
const read=r.end();
const m=cpu();
if(read.outcome!=="read"||read.content.kind!=="profiles")throw new Error("?");
const p=read.content.profiles[0]!;
const fit=fitProfile(profilePoints(p),{edgeExclusion:0.005,robust:true});
console.log((m-s).toFixed(3),(cpu()-s).toFixed(3),fit.curvature,fit.used,p.x.length,Math.round(process.resourceUsage().maxRSS/1024)+" MB");
}
