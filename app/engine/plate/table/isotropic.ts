import { unpackTable, type ShapeTable } from "./shape-table.ts";

/**
 * Shapes of isotropic free plates, ν from 0 to 0.5.
 * Made by `npm run plate-table`, which also measures the error and writes it into errors.ts: not to be edited.
 */
export const ISOTROPIC: ShapeTable = unpackTable({
  generator: 1,
  energy: {
    extent: [20, 14, 6],
    quantum: 0.000001,
    values:
      "o,ioa5,ioegerae5et,heo1theite[,iawn,yiv4f,,n>roSec0mlaowrr2,lsseix,h(dletvn2e!sn.Mw)n2nl:5el.+[sdlpl" +
      ".(ieiuti,nwaon2ot;e,2eRotovtr,fee!S*=iioSei>en2e-beee!t,MnftMdee?t-0wea:iwt.stxo&2frMr5?t+t0:t!ec+d2" +
      ".=eton,&a,nletopenbe+yair?iee(eetkethe0nin2inlr1n|:ni(orcei?n0?eodetSrSe&e!ei?e=L,:g=nTtye=e1eP!p.[=" +
      ":nrindioiRe,iyo4ebftee]ttadice(:,no!irbi-=yir>n,]tkt2ir+et2e=Ma>nge[et.,(fsr*Srfece4eSew*enaedr,rRan" +
      "pt;sni5ee2eepnR2r,t+er)/t1re0eeRrM!,i:iwe51,S?nmeiPemmpnv?t[Tel&iti1teiRne2Sdn,,Srixebe[[ete!negaueg" +
      "en*iTtvtpetvn=txt)e:npi[aSt.eLPdtme:rer]aeRen[e&xtorkrixiv!nn1ri*nhtLa4geba*xtdivtTt.bt/twtMt|ebe,a=" +
      "rn;efxenoLa(tSyercnn]ihe*ap,knLe,]axn=tMn/npi1nw)e2oo]tn-o-har0ta)e,MRntunMo)t,po:e;a[et!nfytbege+t0" +
      "naStile5lt,xeePi=et!tfeServa?ncoSe/yn>imt+,o?.,!,nd,bi-ri5nli.iwtsiTivtstmiye,.ek/r-,1tibRewrxeL),lt" +
      "a1t>e-ta0rlnt]cbrLrvegr+,Rweytwe,MeTr:kee&t*oxt+ei|]tMr:n2tfn[oMtl,5e|nLiselme+e]gg",
  },
  measures: {
    extent: [16, 11, 5],
    quantum: 0.00001,
    values: [
      "tnaeMetuei?*=n,iheokrP4)eeame,:ec1sto&o54;eamtye0ua0ec[tvh(!S[Te?Pr,omeer5ta15hnre&er:enf4)etopiwxSr" +
        "t&ndt2-tnwn4tgerdtve;t2Lt-|(e:tcemi,2eni>eaLu=eroR,el-dan1ntce1]er+t!Mfsixtge(r+Tt&ng,-)e>/et=,n*r=-" +
        "ltriPen)r&|err5a5nmc,r!e2e?tr0n1e?a+n+aSnSi4nk,,liST-ein)a1iskirkea4,Trn;,5e>en0nli2ef,ged,bt]i;vvyi" +
        "eyer/idn|eiMnbsetSekrwtTrsegut;ni+tLem:e.ee*exe,[enmt!e,(rcenvrvaxtRt;e(&ca5t/,:t;od,0o[r1t[tnfr*=n!" +
        "tSd,pe;,?e1e;n]r*e*0?emMcbtRovt&,b![0egt*gnbepe>t:eTe(e[pf+&.[p",
      "atr5ra[r).liRed1usti0elbss[0sst(..s):u*)s(lusls,oh,rm,TslnthtTh(see0el=ut=fdut5g(ks=*lculslsa,5t,Rnm" +
        "csf,Tv(tt!)hut/[)ueb(=|l(0l0(ls,t/tebeTcseaPtuuuow)dsb::?mld)dfc.tcn+b=e/ig0st(tL0e|5uecg1.hl=)tr]n." +
        ";(*nglemt|=t/=)10k:hgerf2sut&&lev]h&ves=cceike.uefe(.tS]hdSl?,f:.,(?:ku];5(rkv(ePb?d?)e;lns1hu&tglT=" +
        "e=de:leu25f0fg=",
      "nnr,.nr]nnke(h,a,>iastbeTpeii+tefn>e?sanLnt0el!rrbevrd(ti1thepi+e?ge!tce2t[rct4tonowtrr>,a?td/on,1e," +
        "Pto+t+;nroMttvLtceni>axo.e+ia-o.i*r,haRn!i-n?afthhnvixn4ee,oftao],t>|*roheaemetMeverhr,cr]exetRi2rTT" +
        "etRe,ki=t5e,RtMee*ohtelf,Ststt4eonuttkM=,ae4irmtdSna,cerdi45eiil,+e?ia5o(n|tipetRto>etdtr-en=op,iSed" +
        "eb,n,;ikei]e1ntn0nr-eiyera4ei?rhri/rftt2,.eo/nLea+a*a=r&tle2tnifr,Ltr>,t?rt;eeyn+na0,=oRrfen/t=esi+e" +
        "n,yr1,;+e[rrSi]rofr,Teemridei0noperfti0a:tstRektn5ta&o&tr4enbn,Ltehntme,*iTentpeaL>eaRih4trpimeaxtdi" +
        "yen=,,gnse]eeuo.t)2=oP,i4o&neMv&>nxt,k*t+rpn0npei.rst!esrd,lt5eR:!",
      "teeauen,[etpu)etavnnS,(0ue,,>1!dsaRr(Lheade(lltlf>rkb)?u((f=ee,o]ten;ttwsfeetf-,ucur,(ofxdiytv/1eake" +
        "ku/we(r0!x=+=mh,aadernwte-=:ee,|ni:t:uoaTo4uuto=a-tpcet-ePsrSt:ge*e[tgcemunot0eea4erw*.ra&,&bs,r+eTe" +
        "5uei/Peyvv.rd2edewe/evea>ni2,Rx,e0tn(=m,+erxt5eost?!,*t/nhpt1vecelrrueiTe)Si]n&Rei[et&e&eeut4epn=e5e" +
        "/e;t1eke,Pefe(*tn=tu)t;nxtcct)aueh)eSaa=r.Teikn5Ttt]tct/g,([thrr),+beiyt!fen4tfeRtMn?l,e5eh.nouthee0" +
        "t5i/5ti[tTerT|nmtln|tnde0ode|r>e>i)e2&r)e]e:.*e0(",
      "t,oa2tegteh/=rnogt,h,pP:eno)er!eL]snoLensRbttytye&uee]e]-n.0(4euMeleke.aae[enicnr1e=grt,/ea-e,[R:e,e" +
        "4aveues,e?n|nm+to)rMt&ei1tTewnfe=n.L(evt]ey,ime,rhtnuu=tenbin2ey=oacntLe(]tr-r.Tmexadt11,MRn?nSi2ft(" +
        ">nau,o|rd!lnt,peil,/5ear=ogrm=i,wt[e]ta]n5e1oRrbeedrko.rdo,weesR+eanyetLa0>angte2i+riwadt(erknyapevi" +
        "ue1ivtLtfes.[in2tega1,ueown+&e,*eLrPnmr>e&=tTraln/evfi)etSe|ei)e,bnmeih,se,y,fo5nbbeh|To/n=o)n.eeLis" +
        "et:,knfto[,uutwn=d,Te+i&e/tprd,deL*e.e;e+s!nlee)n=ibel0/edth]nfeye(tpe4eht[h:y*m!m",
      "eert5irR,y)leo)t=&usnoueM-sse[k(ut&.)sp:(>:scl(slstee*aoloys.re5,:?=see5tlcut*[gur(?(5l=/lhusulsao?n" +
        "ovr4cser1a--=toPe(]u,/v:utvgced.u].](ssar>t,mtphseol,cd(ee!e1]s)k.e0ll?s1mdlev,![dee:o(kut?n0]kec=e/" +
        "00l1ld)re|rw[(>nLstPn0=n?.:u*Spg1tn4T.(i]e/lt:eh0e|ve]d0htrxe[=n:e>.r>S=*e(:/all)a]x:g=kye]ci][=t4ye" +
        "=1SbtfurL];)e=ng)tbhtuhe-st1eve=T&mkc",
      "tteeftnceas/=nnnSnt0tMM)armolts*sto/etL;per+e:e1uahe0veP0(2|yTeh4roileeokti&Ldnnn5et.et;!)etaw,;eh>r" +
        "e]ndt[wttpn.tdenLtpemtvestb>(e)t(eftnt;eeocei0.(e,tmiavn))rtste*kgerP,Re[mn;,ge5S,.4t*ns,p:e&/eruri/" +
        "r=wstrt.eiRngkerednSn[(,r.tRStn/tSe=awn2a>nkiwn*,emerhsbert:er(ih/a,LerM,lno)iLe|er]t)i;e),0ec,ft1i/" +
        "t|sbroyeo=ikocen;t+eLenke/n+e2r(ehhtfromn*ep)ewee?eke,+en;t[enLrset+nPagt-t&c&rmi]tk,mn-ac,uoyr(tpti" +
        "yr*.eMt*u,Rt.,(Lebn*,gec1eweTe.).nmee)tLrfv;dekn]?nMe)t*eMtMec2-?e)eubb:",
    ],
  },
});
