"""A few kills in the middle of saving; ``kills.py`` beside this file runs as many as one likes."""

from __future__ import annotations

import os
import subprocess
import sys
from pathlib import Path

import pytest


@pytest.mark.skipif(not hasattr(os, "fork"), reason="this system cannot fork")
def test_a_kill_leaves_whole_files() -> None:
    """After twenty kills every file is a whole record, and something was really being written."""
    command = [sys.executable, str(Path(__file__).with_name("kills.py")), "20"]
    run = subprocess.run(command, capture_output=True, text=True, check=False)
    assert run.returncode == 0, run.stdout + run.stderr
    found = {line[:32].strip(): int(line[32:]) for line in run.stdout.splitlines()[:-1]}
    assert found["kills while saving"] == found["file whole"] == 10
    assert found["kills while setting aside"] == 10
    assert found["set aside whole"] >= 10
