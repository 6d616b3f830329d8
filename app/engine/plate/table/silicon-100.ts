import { unpackTable, type ShapeTable } from "./shape-table.ts";

/**
 * Shapes of free wafers of silicon (001), rolled about <100> (soft) and about <110> (hard).
 * Made by `npm run plate-table`, which also measures the error and writes it into errors.ts: not to be edited.
 */
export const SILICON_100: { soft: ShapeTable; hard: ShapeTable } = {
  soft: unpackTable({
    generator: 1,
    energy: {
      extent: [20, 14, 1],
      quantum: 0.000001,
      values:
        "oneti=aoa.,oost,!er.epe.eR,cf[sd(tet,*iio-rnokae:atketpt/n.i.2es:huetoir],,gennRrrTeaviRutyee*Mev/1r" +
        "et,1oagit,waeStnyen?,bnhi4b(&eiin]tno>taoboa*,a4eodetl:,Sl+>orr(n,a0eea[e,Ltme(e0Tnfb/rrikeorhea!,+e" +
        ",hurbr.,s=err=ena1ti?e,-e,ltvnse[.!ei,cio1nr:enptisyrbr2n]i>rekotcenveobse>yen,ditxniMecerL,stl,r.n=" +
        "itx&teyytcoe(nndne:ey,1efri2i[n,Snxo[rasttxte4ewt1t,2ee!et/ute1et]nfo;tMn0nd?R",
    },
    measures: {
      extent: [16, 11, 1],
      quantum: 0.00001,
      values: [
        "tt,oPntt*iaPti=ee.rcvsw|)rtn4n,o1eea-rn0tnmet0(;4eh:e,t+een!nict=tT>nht;c?er[t,oPen,=,,2te/eebocr-eg" +
          ",o[e,i:i,>niwen5af,5nbSov,nPngrk,.tged!ntlnvrven=aT,shemiT;ee0rbt*vtn4ewavrS,.nstxest.rgeRaPilfe.:e>" +
          "e->&tme-(c!L;Mv",
        "aiahtrlta1eln5c>gu.soidr,>ers,cnge5eg|s)seeo|eo1te.a&e/tu|SulanLeo4eLthn|ege?/(a5octS,cnueS||stis>tm" +
          ",ce0e*h*eepe5euge5ukea0t.t=ests(s,la5tst?x&igef]&ehe:tLt01&t>h(/ev>ueg)dv0d",
        "ntio2nansetam,,/ti2e,hrpeueRt>2nenrTeee,dnin;eriLanTni0eM1tynLelen,o;tniL,abni=iMmee>a!e|Sai+iti)ret" +
          "Seialan*n,4ne0eil,cro[riepne,&etif,e|tnfeaSo[t5t.tt,wnr(o&etvi1e|e-eeo4ti)timnn*tiven0>|*tt2nase,Ma?" +
          "nbennpeeRnn+tt*eo.ee=,nuenki4et]t),,yto2=e]btt1nkrvtLeifrve*r(,yede-?ef",
        "ttn,?tin.ein&er2nt=f,*e?*v(enee0exaekoSttsee?ogru:bdiaohtnidot;ir|a>eisn0rLv=,trSr,*t/t,5ei*eeSi1n|l" +
          "ri0ee,Simn,ue,1etgrsn5b,i>e,>teft,cee(a=e>t?>t,(e,(tPer?]r=aoger(eo=ouerLe5*nt;erce4,xe(n/,e]tohi*i?" +
          "ogeomr;o(tmt=tesagebn=n4,hect?tl-&n00",
        "tnil,,xtt:iLnwe1[.f=lntimir=tnTihn[euvm)d.r&nipe,>ale1el]2s(ei/,t2tr0i+txevST=nnfa!i]n+ekem>!cr*aweS" +
          "em=;gyee.,+e;e?e2&yec4tTexe2>yr-he)ehpcdefvmf2Myk.w(.pde.l;hs(f.",
        "tntxet4erg0t01kd(sseri&tt=,/nseStce(1uusn/tt1a)i*ehe|>1uuta&nbr0*t&e(ech=haMt1ehe>ehxgle,xrk-n&ke0h?" +
          ",;r]t?ehe1x/i|tpt0Le]ddeMrLS&u/tdem0e(]mt1e?ph5e)=kvekd*-=:g=",
        "ii>roMocn!e|[;u(s.et,yryee-vhl[0cl.eri)trLttync.h!hcsercen]eeht1n(d.dh(tn=oxtxt1]p0ceeurg.|es(ycet.n" +
          "+eRt+x!)n|ryt-em*;[tvrke:e0h*&tm!;L?e5*k/uv!s)5b(M.u](",
      ],
    },
  }),
  hard: unpackTable({
    generator: 1,
    energy: {
      extent: [20, 14, 1],
      quantum: 0.000001,
      values:
        "on,at0ttoeM,an>atMt,|enRbn[rde(.m=se,ro&oroviaa?eirmti(e+eege.tfrleTTcsenita/ettt>taomern=tru+tbnfa0" +
        "tcPcunarng,ei?,eimie5,t4tr0rTr*nbtPtTderioxrn-rielandrovei=etPexrkeSeykitr|no,se,rMtnSeef,=,lx[tpevr" +
        "nr*nie?tt0i[en|0n>tv,h;ea,/eta0nn?ee5te>r;[tfgtvenndeotLnaSno[Ri]t>ebt0recerpa?te&et/eln4t.ioLe,n/ra" +
        "gnr;r2o&t*.ieletytn?txgnwtr1eee*trce,y,l,sr1rema!et5e/,drn>ea|tfevnutt.,TrS1ei?i/nS,vp[n(t1",
    },
    measures: {
      extent: [16, 11, 1],
      quantum: 0.00001,
      values: [
        "t,rtyreo|er,Rnoctt2i?tvmeme(pine-n,,ue,n[,tsneRo5e[e:e[ek[ee,Peityao|ei2/n;n|rffgerhtieme,iu,aTtr0e," +
          "fo|iveg,t!eoelaaur,peasen-ag,pe?nbaa+eedtPn)!t(tfnovaPeopeacer4,ge2iP=er4enxet.n0tvtrwo[etyi]rPeke/r" +
          "hn2nut4o.i-nptSMe=w*e)br+)Ts(0ebv",
        "aet?eytnSt4es+=lslsit?et]a1=e*+)sllsa,Lbtr.mtM(fdlsro>eover;4el;p=.br+ewewpb:u)tr(tvnws-))=ei+]n;?(:" +
          ")ei/]e]evumdibxdc>mr*)we)wtw)wc0t?1S-e[44//dmpl",
        "n,n,-atahtno2eerk,r2texilln+n?Pne,afonokreife,nSonwnt(tRt!rprSewetri[naktogomo2ee.e,cerp(eueom,in:ni" +
          "i&eii!iigrr.ntSttpr0r;itamnrnxe,i!,ikno+t,xei-nSe,]nenbir=eo[r!nbi>,!ent:trp,if,tsre.ei]nfo+tnsna)ro" +
          "snr:ee1,.etnyt,yr,2tn=ei[,/nt*tosa+erueeMrnTn,2en2,he;ee]nht*wr:eememe4nMeLe|tfe2",
        "eo,t*anmeniuteRet0rTtk:sb(eteexeaa!rn5tt:o*,4ecd2Md,,aSro?eti+r]te:5ePeLe).noaLie0ao.oLeeMeueRe5em,g" +
          "t0nt:[t:PfS4na0e4nevnve4eR)]ttbtt=en.n;e&eP.itLetua0aMLeMednrlti[etp,ftceMntsnn0*e!eme,weaTrytbe&iSi" +
          "skt4e/Ptfr-fe4tkxeb",
        "eoo2ir/tePeegn!e5y(fclne,yio0trlo?rMt=s.:h.e/naler|i!tce:ed!u(neuitpne=eeMr(ePeSelhtiTer[o*n.exRec2d" +
          "t/eRke(yd1;ol,;ue]ewSutSe:t:t?e[|pi:exeTeSem/SyR*:4em*clu]vhpPdh((::(",
        "tee(et[i5tM:+.lsssenedfefePMPb)llsikeekoT=t[ybssleo>gr[!!2;ls,Te,vtmn;+Tflse,?nmnle;epymueefeStP=Mff" +
          "r/t2:ebyvue!?;-cme(eb;b[ele?el)u]eRgwfSy)blss.",
        "tno0eivta5ebtkv1s(.s,t|aRadtwt(bcu=.ueta[nbtoP1n:0mhusgi/enle5e!Sv0leuen(r]t(m/md.erko0th&u(l(o!e1hP" +
          "&fdi?tTt>e)]f1ewtSky0l=eR0.[fe0y-s?e.ed=vegycv1.hs",
      ],
    },
  }),
};
