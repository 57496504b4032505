# Finds the composition of least Gibbs energy with SciPy's general minimisers. Reads problems as JSON from standard input and
# writes their answers to standard output; knows no chemistry beyond ideal gases and pure condensed phases.
# Twice: the amounts are varied under the balances of the elements (trust-constr with exact first and second derivatives), and
# the element potentials are varied so that no phase is worth less than its atoms (SLSQP on the dual, a concave problem).
# Each method stops by its own tolerance. Amounts are scaled to one mole of atoms in all.

import json
import sys
import time
import warnings

import numpy as np
import scipy
from scipy.optimize import Bounds, LinearConstraint, linprog, minimize, nnls

warnings.filterwarnings("ignore")
LEAST = 1e-14  # mol: the lower bound of an amount, which keeps its logarithm finite


def evenly(atoms, b):
    """A composition that keeps the balances, its smallest amount as large as can be."""
    count = len(atoms)
    return linprog(
        np.r_[np.zeros(count), -1.0],
        A_ub=np.c_[-np.eye(count), np.ones(count)],
        b_ub=np.zeros(count),
        A_eq=np.c_[atoms.T, np.zeros(len(b))],
        b_eq=b,
    ).x[:count]


def primal(atoms, b, gibbs, gas_count):
    """The amounts, by an interior-point method; gibbs holds g/RT with the pressure's logarithm added to the gases'."""
    count = len(gibbs)

    # A trial step may leave the bounds: there the logarithms go on from just inside, and the method turns back by itself.
    def guarded(n):
        return np.maximum(n[:gas_count], LEAST / 10)

    def value(n):
        gas = guarded(n)
        return np.dot(n, gibbs) + np.dot(n[:gas_count], np.log(gas / gas.sum()))

    def gradient(n):
        gas = guarded(n)
        slope = gibbs.copy()
        slope[:gas_count] += np.log(gas / gas.sum())
        return slope

    def curvature(n):
        gas = guarded(n)
        second = np.zeros((count, count))
        second[:gas_count, :gas_count] = np.diag(1.0 / gas) - 1.0 / gas.sum()
        return second

    result = minimize(
        value,
        evenly(atoms, b),
        jac=gradient,
        hess=curvature,
        method="trust-constr",
        bounds=Bounds(np.full(count, LEAST), np.full(count, np.inf), keep_feasible=True),
        constraints=[LinearConstraint(atoms.T, b, b)],
        options={"xtol": 1e-8, "gtol": 1e-14, "barrier_tol": 1e-11, "maxiter": 3000},
    )
    return {
        "gibbsOverRT": float(value(result.x)),
        "amounts": result.x.tolist(),
        "balance": float(np.max(np.abs(atoms.T @ result.x - b) / b)),
        "iterations": int(result.nit),
    }


def dual(atoms, b, gibbs, gas_count):
    """The potentials of the elements, by sequential quadratic programming."""

    def log_sum(potentials):
        exponents = atoms[:gas_count] @ potentials - gibbs[:gas_count]
        top = exponents.max()
        weights = np.exp(exponents - top)
        return top + np.log(weights.sum()), weights / weights.sum()

    constraints = [
        {
            "type": "ineq",
            "fun": lambda y: -log_sum(y)[0],
            "jac": lambda y: -(log_sum(y)[1] @ atoms[:gas_count]),
        }
    ]
    if gas_count < len(gibbs):
        constraints.append(
            {
                "type": "ineq",
                "fun": lambda y: gibbs[gas_count:] - atoms[gas_count:] @ y,
                "jac": lambda y: -atoms[gas_count:],
            }
        )
    # Lowered until every phase is worth less than itself: a start inside all constraints.
    middle = np.linalg.lstsq(atoms, gibbs, rcond=None)[0]
    excess = np.max(atoms @ middle - gibbs) + np.log(gas_count) + 1.0
    start = middle - max(excess, 0.0) / np.min(atoms.sum(axis=1))
    result = minimize(
        lambda y: -np.dot(b, y),
        start,
        jac=lambda y: -b,
        method="SLSQP",
        constraints=constraints,
        options={"ftol": 1e-15, "maxiter": 3000},
    )
    potentials = result.x
    fractions = np.exp(atoms[:gas_count] @ potentials - gibbs[:gas_count])
    # How much of the gas and of each condensed phase whose atoms are worth as much as it.
    condensed = [k for k in range(gas_count, len(gibbs)) if gibbs[k] - atoms[k] @ potentials < 1e-6]
    columns = [fractions @ atoms[:gas_count]] + [atoms[k] for k in condensed]
    shares = nnls(np.array(columns).T, b)[0]
    amounts = np.zeros(len(gibbs))
    amounts[:gas_count] = shares[0] * fractions
    amounts[condensed] = shares[1:]
    return {
        "boundOverRT": float(np.dot(b, potentials)),
        "potentials": potentials.tolist(),
        "amounts": amounts.tolist(),
        "balance": float(np.max(np.abs(atoms.T @ amounts - b) / b)),
        "iterations": int(result.nit),
    }


def main():
    asked = json.load(sys.stdin)
    answers = []
    for problem in asked["problems"]:
        arrays = (np.array(problem["atoms"], float), np.array(problem["elementMol"], float), np.array(problem["gibbs"], float))
        answer = {}
        for name, method in (("trustConstr", primal), ("slsqp", dual)):
            began = time.perf_counter()
            found = method(*arrays, problem["gasCount"])
            answer[name] = {**found, "seconds": time.perf_counter() - began}
        answers.append(answer)
    print(json.dumps({"version": scipy.__version__, "answers": answers}))


main()
