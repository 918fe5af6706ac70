"""What is loaded before Qt, so that the window paints sooner. Import this first, then ``application``.

Once Qt for Python is loaded it reads the source of every module that is imported after it, to see whether that
module uses it. What needs no Qt therefore comes before. Starting makes many objects and drops none, so the
collector rests until the window has painted.
"""

from __future__ import annotations

import gc

gc.disable()

import signal  # noqa: E402, F401
import threading  # noqa: E402, F401
from importlib import import_module  # noqa: E402, F401

import fourcount.face.grid_forms  # noqa: E402
import fourcount.ink.palette  # noqa: E402
import fourcount.picture.plan  # noqa: E402
import fourcount.record.paper  # noqa: E402
import fourcount.wording.labels  # noqa: E402
import fourcount.wording.standing  # noqa: E402, F401
