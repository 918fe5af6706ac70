"""The parts of the first column that few papers need: each is made when it is first asked for."""
