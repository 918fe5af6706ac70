"""The interval methods of one risk: x of n people, p = x/n."""

from __future__ import annotations

from fourcount.stats import risk
from fourcount.stats.entries.entry import Method

RISK_METHODS = (
    Method(
        key="wilson",
        measure="risk",
        interval=risk.wilson,
        title="Wilson score",
        formula="(2x + z² ∓ z √(z² + 4x(1−p))) / (2(n + z²))",
        source="Wilson 1927, J Am Stat Assoc 22:209; Newcombe 1998, Stat Med 17:857, method 3",
        note="Holds the risks that a two-sided z test would keep. It stays within 0 to 1, also at 0 and at n events.",
    ),
    Method(
        key="wilson-continuity",
        measure="risk",
        interval=risk.wilson_continuity,
        title="Wilson score with continuity correction",
        formula=(
            "Lower: (2x + z² − 1 − z √(z² − 2 − 1/n + 4p(n(1−p) + 1))) / (2(n + z²)); "
            "upper: (2x + z² + 1 + z √(z² + 2 − 1/n + 4p(n(1−p) − 1))) / (2(n + z²))"
        ),
        source="Newcombe 1998, Stat Med 17:857, method 4",
        note="The lower limit is 0 at no events, the upper 100% where everybody had the event. Wider than Wilson’s.",
    ),
    Method(
        key="clopper-pearson",
        measure="risk",
        interval=risk.clopper_pearson,
        title="Clopper–Pearson exact",
        formula="Lower L: P(X ≥ x) = alpha/2 at risk L; upper U: P(X ≤ x) = alpha/2 at risk U; X binomial of n",
        source="Clopper and Pearson 1934, Biometrika 26:404",
        note="Covers the true risk at least as often as its level says, and usually more often, so it is wide.",
    ),
    Method(
        key="mid-p",
        measure="risk",
        interval=risk.mid_p,
        title="Binomial mid-P",
        formula=(
            "Lower L: P(X > x) + P(X = x)/2 = alpha/2 at risk L; upper U: P(X < x) + P(X = x)/2 = alpha/2 at risk U"
        ),
        source="Newcombe 1998, Stat Med 17:857",
        note="Half of the observed count’s own probability in each tail: narrower than Clopper–Pearson.",
    ),
    Method(
        key="wald",
        measure="risk",
        interval=risk.wald,
        title="Wald",
        formula="p ∓ z √(p(1−p)/n)",
        source="Common practice; Newcombe 1998, Stat Med 17:857, method 1",
        note="Can pass 0 or 100% and is given as it is. At 0 or n events its width would be zero, so none is given.",
    ),
    Method(
        key="logit",
        measure="risk",
        interval=risk.logit,
        title="Logit",
        formula="The odds o = x/(n−x) with limits o exp(∓ z √(1/x + 1/(n−x))), each turned into the risk o/(1+o)",
        source="Woolf 1955, the part of one group",
        note="The textbook interval of odds. At 0 or n events it does not exist, so none is given.",
    ),
    Method(
        key="agresti-coull",
        measure="risk",
        interval=risk.agresti_coull,
        title="Agresti–Coull",
        formula="ñ = n + z², p̃ = (x + z²/2)/ñ; p̃ ∓ z √(p̃(1−p̃)/ñ), cut to 0 and 100%",
        source="Agresti and Coull 1998, Am Stat 52:119",
        note="The cut at 0 and 100% is part of the method.",
    ),
    Method(
        key="jeffreys",
        measure="risk",
        interval=risk.jeffreys,
        title="Jeffreys",
        formula="The alpha/2 and 1 − alpha/2 quantiles of the beta distribution with x + 1/2 and n − x + 1/2",
        source="Brown, Cai and DasGupta 2001, Stat Sci 16:101",
        note="The lower limit is 0 at no events, the upper 100% where everybody had the event, as the source advises.",
    ),
)
