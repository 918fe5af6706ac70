"""The two sides of pairs as sentences name them: as the reader does, or as the design does."""

from __future__ import annotations

from fourcount.appraisal.discordant import pairs_that_differ

__all__ = ["pairs_that_differ"]
