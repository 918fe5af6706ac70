"""What is wrong with something that was typed: one sentence for every mark."""

from __future__ import annotations

MARK_TEXTS = {
    "not-a-count": "{text}: a whole number of people is needed, such as 38",
    "negative": "{text}: a count cannot be negative",
    "decimal": "{text}: people are counted whole, without decimals",
    "point-in-thousands": "{text}: people are counted whole; a thousands mark is a comma, as in {comma}",
    "two-counts": "{text}: one count in each cell",
    "too-large": "{text}: a count goes up to {limit}",
    "events-above-total": "{text}: more events than people; the events have to fit into the total",
    "total-disagrees": "{text}: the total here is {typed}, but the group’s total is {total}; check the paper",
    "percent-disagrees": "{text}: {events} of {total} does not round to this percentage; the count is used",
    "read-as": "{text}: read as {value}; two counts need two cells",
    "not-a-risk": "{text}: a risk is needed, such as 12% or 12 in 100",
    "percent-or-fraction": "{text}: this could be a percentage or a fraction; write it with its sign, such as 12%",
    "risk-out-of-range": "{text}: a risk lies between 0% and 100%",
    "not-a-level": "{text}: a confidence level is needed, such as 95%",
    # percentages, pairs, person-time, printed risks
    "percent-several": "{text}: {counts} of {total} all round to this percentage; {value}, the nearest, is taken",
    "percent-none": "{text}: no whole number of {total} rounds to this percentage; {value}, the nearest, is taken; "
    "check the paper",
    "percent-below": "{text}: a bound gives no count; type the number of people",
    "not-a-percent": "{text}: a percentage is needed here, such as 9.2%",
    "not-a-time": "{text}: person-time is needed, a number such as 4,120",
    "negative-time": "{text}: person-time cannot be negative",
    "time-disagrees": "{text}: the person-time here is {typed}, but {total} stands beside it; check the paper",
    "units-differ": "{text}: the other group’s person-time is in {unit}; rates need one unit",
    "not-limits": "{text}: two limits are needed, such as 6 to 12",
    "limits-disordered": "{text}: the lower limit lies above the upper one, or the risk outside both; check the paper",
    # losses and clusters
    "not-an-amount": "{text}: a number is needed",
    "negative-amount": "{text}: this cannot be negative",
    "icc-out-of-range": "{text}: an intracluster correlation lies from 0 to 1",
    "cluster-too-small": "{text}: a cluster holds one person at least, so its mean size is at least 1",
    # what the paper prints as its result
    "paper-unreadable": "{text}: no result can be read here; “0.54 (0.37 to 0.78), p = 0.001” would do",
    "paper-measure": "{text}: a result of another kind than events give; it is left out",
    "paper-leftover": "{text}: this number was not understood; the rest is used",
    "paper-one-limit": "{text}: an interval needs two limits, and {limit} is only one; the estimate is used without it",
    "paper-limits-order": "{text}: the first limit, {low}, is larger than the second, {high}; check the paper",
    "paper-limits-outside": "{text}: {estimate} lies outside its own limits, {low} and {high}; check the paper",
    "paper-level": "{text}: a confidence level lies between 50% and 100%; the result is used without one",
    "paper-p": "{text}: a p lies between 0 and 1; {p} is left out",
    "paper-too-long": "{text}: too long to be read; a sentence or two would do",
    "level-out-of-range": "{text}: a confidence level here lies between 80% and 99.9%",
}
