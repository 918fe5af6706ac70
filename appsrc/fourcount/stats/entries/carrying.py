"""How an effect is carried to a starting risk, and where a starting risk comes from.

q is the starting risk, with the risk under the effect; s the share of people exposed, P the risk of all of them.
Newcombe 2011 and Newcombe and Bender 2014 are cited from memory.
"""

from __future__ import annotations

from fourcount.stats.entries.entry import Calculation

CARRYING = (
    Calculation(
        key="carried-risk-ratio",
        title="Risk ratio at a starting risk",
        formula="with = q R; difference = q (R − 1)",
        source="Cochrane Handbook 15.4.4",
        note="Takes the risk ratio as the same at every starting risk. Where q R passes 100%, nothing is given.",
    ),
    Calculation(
        key="carried-odds-ratio",
        title="Odds ratio at a starting risk",
        formula="with = q O/(1 − q + q O); difference = with − q",
        source="Cochrane Handbook 15.4.4",
        note="Takes the odds ratio as the same at every starting risk. It stays between 0 and 100%.",
    ),
    Calculation(
        key="carried-hazard-ratio",
        title="Hazard ratio at a starting risk",
        formula="with = 1 − (1 − q)^h; difference = with − q",
        source="Altman and Andersen 1999, BMJ 319:1492",
        note="Takes hazards as proportional over the whole time span, and nothing else as ending the follow-up.",
    ),
    Calculation(
        key="carried-rate-ratio",
        title="Rate ratio at a starting risk",
        formula="with = 1 − (1 − q)^r, r the rate ratio; difference = with − q",
        source="Common practice; as for a hazard ratio",
        note="Takes both rates as constant over the time span.",
    ),
    Calculation(
        key="carried-difference",
        title="Risk difference at a starting risk",
        formula="with = q + D",
        source="Common practice",
        note="Takes the difference as the same at every starting risk, which is seldom so far from the study’s own.",
    ),
    Calculation(
        key="risk-ratio-from-odds-ratio",
        title="Odds ratio as a risk ratio at a starting risk",
        formula="R = O/(1 − q + q O), at the odds ratio and at each of its limits",
        source="Zhang and Yu 1998, JAMA 280:1690; Grant 2014",
        note=(
            "With an adjusted odds ratio it is only approximate (McNutt 2003, AJE 157:940). At the study’s own "
            "starting risk the table’s own risk ratio stands in its place."
        ),
    ),
    Calculation(
        key="propagated",
        title="Propagated imprecision of effect and starting risk",
        formula=(
            "The least and the greatest figure over z1 = z sin t, z2 = z cos t, 0 ≤ t < 2π: q at z1 is Wilson’s limit "
            "of the starting risk, the effect at z2 is E exp(z2 × its error), on its own scale for a difference"
        ),
        source="Newcombe 2011, Commun Stat Theory Methods 40:3154; Newcombe and Bender 2014, Evid Based Med 19:6",
        note=(
            "For a starting risk of other people than the effect’s. Each side of an interval has its own error; of a "
            "starting risk printed with limits, each side is that of the number of people whose Wilson limit it is. A "
            "difference kept constant has its own limits."
        ),
    ),
    Calculation(
        key="starting-risk-overall",
        title="Starting risk from an overall risk",
        formula=(
            "P = (1 − s) q + s with, solved for q. Odds ratio: q = 2P/(b + √(b² + 4aP)), a = (1 − s)(O − 1), "
            "b = sO + 1 − s − P(O − 1); risk ratio: q = P/(1 − s + sR); difference: q = P − sD; hazard ratio: by steps"
        ),
        source="Algebra of the mixture",
        note="Solved again at each limit of the effect. The share exposed and the overall risk are taken as certain.",
    ),
    Calculation(
        key="risk-from-rate",
        title="Starting risk from a rate",
        formula="q = 1 − exp(−rate × time)",
        source="Common practice",
        note="Takes the rate as constant over the time, and counts the first event of each person.",
    ),
    Calculation(
        key="other-span",
        title="Risks over another time span",
        formula="1 − (1 − risk)^(t2/t1), for both groups’ risks, t1 the study’s time span",
        source="Common practice",
        note=(
            "Takes both hazards as constant. Both risks change span, then they are compared: a ratio or a difference "
            "by itself does not stay the same."
        ),
    ),
)
"""Calculations that lead to one patient’s risks."""
