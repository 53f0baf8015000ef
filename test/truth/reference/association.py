"""Measures random tables with nltk, scipy and scikit-learn: JSON from standard input, JSON to standard output."""

import json
import math
import sys

from nltk.metrics.association import BigramAssocMeasures
from scipy.spatial.distance import cosine
from scipy.stats import chi2_contingency, entropy
from sklearn.metrics import mutual_info_score, normalized_mutual_info_score, rand_score


def measure_table(cells):
    both, first, second, neither = cells
    n = sum(cells)
    margins = (both, (both + first, both + second), n)
    square = [[both, first], [second, neither]]
    return {
        "t": BigramAssocMeasures.student_t(*margins),
        "chi": BigramAssocMeasures.chi_sq(*margins),
        "pmi": BigramAssocMeasures.pmi(*margins),
        "dice": BigramAssocMeasures.dice(*margins),
        "likelihood": BigramAssocMeasures.likelihood_ratio(*margins),
        "g2": chi2_contingency(square, correction=False, lambda_="log-likelihood")[0],
        "pearson": chi2_contingency(square, correction=False)[0],
    }


def measure_contingency(table):
    total = sum(map(sum, table))
    left, right = [], []
    for i, row in enumerate(table):
        for j, count in enumerate(row):
            left += [i] * count
            right += [j] * count
    cells = [count for row in table for count in row]
    rows = [sum(row) for row in table]
    joint = entropy([c / total for c in cells], base=2)
    return {
        "entropy": entropy(rows, base=2),
        "joint": joint,
        "conditional": joint - entropy(rows, base=2),
        "mutual": mutual_info_score(left, right) / math.log(2),
        "nmi": normalized_mutual_info_score(left, right),
        "rand": rand_score(left, right),
    }


def measure_vectors(pair):
    a, b = pair
    smaller = sum(min(x, y) for x, y in zip(a, b))
    larger = sum(max(x, y) for x, y in zip(a, b))
    return {"cosine": 1 - cosine(a, b), "jaccard": smaller / larger}


work = json.load(sys.stdin)
json.dump(
    {
        "tables": [measure_table(t) for t in work["tables"]],
        "contingencies": [measure_contingency(t) for t in work["contingencies"]],
        "vectors": [measure_vectors(v) for v in work["vectors"]],
    },
    sys.stdout,
)
