"""What may be understood otherwise in a paste, by key."""

from __future__ import annotations

PASTE_DOUBTS = (
    "others-or-totals",  # two plain counts a group: the second was taken as those without the event, or as the total
    "orientation",  # groups may run down or across
    "pairs-or-groups",  # counts of pairs, or of two groups
    "percent-disagrees",  # a percentage beside a count is not what the count gives
    "no-totals",  # no total was found, or only one
    "totals-by-percent",  # the totals stand elsewhere and were told by the percentages
    "more-counts",  # there are more counts than those of two groups: the first two were taken
    "several-rows",  # rows of several outcomes: the first was taken
    "strata-or-outcomes",  # several rows were taken as strata of one outcome
    "total-left-out",  # a row or column of totals was left out
    "left-out",  # a row or column was not understood and left out
    "rates-unchecked",  # events and person-time, whose unit was not printed beside each
    "comma-pairs",  # a comma was taken as a border between two counts, not as a thousands mark
    "point-thousands",  # points in whole numbers were taken as thousands marks, beside decimal commas
    "totals-disagree",  # a total is not the sum of its counts
    "counts-left-out",  # counts were not understood: only the printed result was taken
    "not-compared",  # nothing says that the two counts are of two groups
    "changed-count",  # a rise or a fall: the counts may be those of one group at two times
)
"""Every key of ``Pasted.ambiguous``. The window shows what was understood before it is taken where one is listed."""
