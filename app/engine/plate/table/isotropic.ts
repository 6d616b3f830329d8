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
      "tei.aht5=siturx;lleoT?>(sodt(..nfsgst=?.M=s.c):d)neemteh,sduin5nbtp.ltew!?=i/ky.r[20tdbfbcb=sf?fa*e," +
        "*n(ssrtbet+T.en&>;sa4em:lex]=-P)/]e).g=tr5,g(:s,i;t45(tad0Rlo22cn=1(em+e?&e:/to[t=).o;n*e0ci&eTTnfeg" +
        "gecb[:&dP0r=e0gltmrxedede4m&t/?;v>0(yopx)l,le?=wt:bec|t.!edbe5c(el&*tP+e&ke-e=M,p].edhs[;e?cPx&1(eb." +
        "el:;l+0RfLd.fdd:M)lcRkudf:mu",
      "teise,be;lsee)5hssee/-:ssRc(u/sls:suhls(susssenedtn2t-sla/tp(us*Rus?p(secusgls=s(suusst1etve-sserxe2" +
        "fui)edhsns=lsPdu0ll=l=sustt=n!b(s.n=cuefekgsg>(euds==dluunwt..(et!e>cuh1=efh(1(lucs(se,hey:sh/ueMks&" +
        "flv(h)u=aM..un|5s2&=e(s](d(i(b(ePxse5g)hd)he!=lt1gsm(u)/(eL)uPl>d*pT(eL(-:0es.ew=5ubue0-d-glhu",
      "e,o1ee=/=sttvee|thdstns,=|us.tu]ut]egus)d=1=sulus.ut,2nx+ul,!t(S(s&edk.e:sdueh|.m((?uclsu.uerrweiwe[" +
        ")lemei;ty;neboMTffn:Tln;e;vf;lfpgllse5rTsuurSnTevfnMrlm.&efy2wf=l.mg.n>,0SceoLr/huee?nd|ndeuue=50((l" +
        "d.e,snd0ueesn*?r?ng&eL&uSe((ld=ee[]luy).:.he):x1;?,(4srbe;l.emel;u;dnmsft=;:M+my.l|puePwvp?m+ded0c:h" +
        "euufc&*!(>pkvg;(=",
    ],
  },
});
