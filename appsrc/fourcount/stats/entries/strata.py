"""What pools several tables of one outcome, and the tests of several tables; Σ adds up over the strata."""

from __future__ import annotations

from fourcount.stats import homogeneity, strata
from fourcount.stats.entries.entry import HomogeneityEntry, Method, Test

_ALL_FAMILIES = "Asymptotic; every family pools alike."

STRATA_METHODS = (
    Method(
        key="sato",
        measure="pooled_risk_difference",
        interval=strata.sato_difference,
        title="Mantel–Haenszel, Sato’s variance",
        formula=(
            "D = Σ((a n2 − c n1)/N) / W, W = Σ(n1 n2/N); D ∓ z √((D ΣP + ΣQ)/W²), "
            "P = (n1² c − n2² a + n1 n2 (n2 − n1)/2)/N², Q = (ad + bc)/(2N)"
        ),
        source="Sato 1989, Biometrics 45:1323",
        note="Holds for few large strata and for many small ones. Can pass −100 or 100 points. " + _ALL_FAMILIES,
    ),
    Method(
        key="greenland-robins",
        measure="pooled_risk_difference",
        interval=strata.greenland_robins_difference,
        title="Mantel–Haenszel, Greenland and Robins’s variance",
        formula=("D = Σ((a n2 − c n1)/N) / W, W = Σ(n1 n2/N); D ∓ z √(Σ((ab n2³ + cd n1³)/(n1 n2 N²)))/W"),
        source="Greenland and Robins 1985, Biometrics 41:55",
        note=(
            "Holds for few large strata, and is too narrow with many small ones; with one stratum it is Wald’s. "
            "Can pass −100 or 100 points. " + _ALL_FAMILIES
        ),
    ),
    Method(
        key="greenland-robins",
        measure="pooled_risk_ratio",
        interval=strata.greenland_robins_ratio,
        title="Mantel–Haenszel, Greenland and Robins’s variance",
        formula=("R = Σ(a n2/N) / Σ(c n1/N); R exp(∓ z √V), V = Σ((m n1 n2 − a c N)/N²) / (Σ(a n2/N) Σ(c n1/N))"),
        source="Greenland and Robins 1985, Biometrics 41:55",
        note=(
            "With one stratum it is Katz’s interval. Where the pooled ratio is 0 or infinite, no interval is given. "
            + _ALL_FAMILIES
        ),
    ),
    Method(
        key="robins-breslow-greenland",
        measure="pooled_odds_ratio",
        interval=strata.robins_breslow_greenland,
        title="Mantel–Haenszel, Robins, Breslow and Greenland’s variance",
        formula=(
            "O = ΣR/ΣS, R = ad/N, S = bc/N; O exp(∓ z √V), P = (a + d)/N, Q = (b + c)/N, "
            "V = ΣPR/(2(ΣR)²) + Σ(PS + QR)/(2 ΣR ΣS) + ΣQS/(2(ΣS)²)"
        ),
        source="Mantel and Haenszel 1959; Robins, Breslow and Greenland 1986, Biometrics 42:311",
        note=(
            "With one stratum it is Woolf’s interval. Where the pooled odds ratio is 0 or infinite, no interval is "
            "given. " + _ALL_FAMILIES
        ),
    ),
)

STRATA_TESTS = (
    Test(
        key="cmh",
        title="Cochran–Mantel–Haenszel",
        formula="(Σa − ΣE)² / ΣV, E = n1 m/N, V = n1 n2 m (N−m) / (N² (N−1)); one degree of freedom",
        source="Cochran 1954; Mantel and Haenszel 1959",
        note="No continuity correction. With one stratum it is the (N−1) chi-square.",
        p=strata.cochran_mantel_haenszel,
    ),
    Test(
        key="cmh-corrected",
        title="Cochran–Mantel–Haenszel with continuity correction",
        formula="(|Σa − ΣE| − 1/2)² / ΣV, E and V as without the correction; one degree of freedom",
        source="Mantel and Haenszel 1959",
        note="Papers print it. The correction takes away no more than there is: below 1/2 the chi-square is 0.",
        p=strata.cochran_mantel_haenszel_corrected,
    ),
)

HOMOGENEITY_TESTS = (
    HomogeneityEntry(
        key="breslow-day",
        title="Breslow–Day",
        formula=(
            "Σ(a − A)²/v, v = 1/(1/A + 1/(n1−A) + 1/(m−A) + 1/(n2−m+A)); A has the stratum’s margins and the pooled "
            "odds ratio; degrees of freedom: strata less one"
        ),
        source="Breslow and Day 1980",
        note=(
            "A stratum without events, or with nothing else, is not counted. In strata of a few people it finds "
            "differences that are not there, and in few strata it overlooks large ones."
        ),
        test=homogeneity.breslow_day,
    ),
    HomogeneityEntry(
        key="breslow-day-tarone",
        title="Breslow–Day with Tarone’s correction",
        formula="Breslow and Day’s chi-square less (Σa − ΣA)²/Σv, the same degrees of freedom",
        source="Tarone 1985, Biometrika 72:91",
        note=(
            "Takes off what the pooled odds ratio, which is not the likeliest one, adds. In strata of a few people it "
            "finds differences that are not there."
        ),
        test=homogeneity.breslow_day_tarone,
    ),
)
