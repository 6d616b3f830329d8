import { unpackTable } from "../smooth-table.ts";

/* Made by `npm run gravity-table` from app/engine/gravity/generator; not to be edited. */

/** Edge ring: logarithm of the sag over that of small deflections; for each load, for each Poisson's ratio. */
export const RING_LOGARITHMS = /* @__PURE__ */ unpackTable(
  "elt:r!etpt,Ronftaili,,2aarMretLte,e5etre0,r;n,nftan-ear[eto.onP,oRnr!erbn2vgd=duc?=Ttf+ewnbaveaP,oRt" +
    "eiP,re;onoT,,4ear,0e,oa=e,r=nnrmneamte,;ert+eetMi,;nolei:r!e)s.uluuh=2tb[e)tb,ven;rn-e,tfrtofoetlrri" +
    "ven,,keo,ogrir>titfnna)tna-e,ivetePatTrn-eoT,Re!;ys)mcugelt);!e+n2aRne;eerpntryaet[aeo.ine&teiesoieg" +
    "enn+nra2tirlearlentToe;ro2tr:aMt-el;y:p()?Ttm",
  4,
  1000000,
);

/** Three points at the rim: peak to valley over that of small deflections; for each load, for each Poisson's ratio. */
export const POINT_RATIOS = /* @__PURE__ */ unpackTable(
  "etoeoasre,mnti[aePerndetn=ee,pt,,[ee,.eea=tii1t,n*on0etorin(erewene)ie:eegohrabi,wi]etehtt,steou,i0e" +
    "toiet=iPe,2n,wie2eetprn+ar|eri|ett=er,/e,t1ne&eto,ii?ta[eoPetM,rfeorPerrPeoexntnken,5,,|atdak",
  4,
  1000000,
);
