"""Limits behind a value, as print sets them: ``(9 to 15)``, ``[95% CI, 9-15%]``."""

from __future__ import annotations

import re

NUMBER = r"(?:[0-9]+(?:[.,\u00b7][0-9]+)?|[.,\u00b7][0-9]+)"
SIGN = r"%|per ?cent"
_INTERVAL = r"(?:CI|C\.I\.|confidence (?:interval|limits))"

LIMITS = (
    rf"[,;:]? *[(\[]? *(?:(?:(?P<level>[0-9.,\u00b7]+) *% *-? *{_INTERVAL}|{_INTERVAL}) *[:,;]? *)?"
    rf"(?P<low>{NUMBER})(?: *(?P<low_sign>{SIGN}))? *(?:-| to |, |; | and ) *"
    rf"(?P<high>{NUMBER})(?: *(?P<high_sign>{SIGN}))? *[)\]]?"
)
"""Two limits, maybe in brackets, maybe with their level. A comma parts them only before a space."""

BEHIND = re.compile(rf"(?P<value>.*?[0-9%t]) *(?P<limits>(?: |[(\[,;]){LIMITS})", re.IGNORECASE)
"""A value with limits behind it; whoever reads it reads the value as one without limits."""
