#include "published/judge.hpp"

#include <cmath>
#include <exception>
#include <stdexcept>

#include "published/operations.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger::published {
namespace {

double in_unit(double canonical, std::optional<Dimension> dimension, const std::string& unit) {
    if (!dimension) {
        if (!unit.empty()) throw std::runtime_error("a plain number has no unit '" + unit + "'");
        return canonical;
    }
    const auto found = find_unit(unit, *dimension);
    if (!found) throw std::runtime_error("'" + unit + "' is not a unit of the result");
    return found->from_canonical(canonical);
}

std::vector<double> from_function(const Computation& computation, const ValueRow& expected) {
    const Operation& operation = find_operation(computation.operation);
    Inputs inputs = computation.inputs;
    std::vector<double> values;
    for (std::size_t i = 0; i < expected.numbers.size(); ++i)
        values.push_back(in_unit(operation.value(inputs, i), operation.dimension, expected.unit));
    const auto unused = inputs.unused();
    if (!unused.empty()) throw std::runtime_error("input '" + unused.front() + "' is not used");
    const auto longer = inputs.longer_than(expected.numbers.size());
    if (!longer.empty())
        throw std::runtime_error("input '" + longer.front() + "' is longer than the result");
    return values;
}

std::size_t step_ending_at(const StormBooks& books, const Printed& end, const std::string& unit) {
    const auto at = parse_quantity(end.text + " " + unit, Dimension::time);
    if (!at.value) throw std::runtime_error(at.problem);
    constexpr double kSameInstantH = 1.0e-9;
    for (std::size_t i = 0; i < books.end_h.size(); ++i)
        if (std::abs(books.end_h[i] - *at.value) < kSameInstantH) return i;
    throw std::runtime_error("no step ends at " + end.text + " " + unit);
}

std::vector<std::size_t> steps_of(const Computation& computation, const StormBooks& books) {
    std::vector<std::size_t> steps;
    if (computation.at) {
        for (const Printed& end : computation.at->numbers)
            steps.push_back(step_ending_at(books, end, computation.at->unit));
        return steps;
    }
    for (std::size_t i = 0; i < books.rows.size(); ++i)
        steps.push_back(i);
    return steps;
}

std::vector<double> from_storm(const Computation& computation, const ValueRow& expected,
                               const StormBooks& books) {
    const StormQuantity& quantity = find_storm_quantity(computation.quantity);
    std::vector<std::size_t> steps{0};
    if (quantity.per_step) steps = steps_of(computation, books);
    if (!quantity.per_step && computation.at)
        throw std::runtime_error("`at` is not used: the quantity is one of the whole storm");
    std::vector<double> values;
    for (const std::size_t step : steps)
        values.push_back(in_unit(quantity.value(books, step), quantity.dimension, expected.unit));
    return values;
}

std::vector<double> evaluate(const CheckFile& file, const Computation& computation,
                             const ValueRow& expected, const BookKeeper& keeper) {
    const auto values =
        computation.storm.empty()
            ? from_function(computation, expected)
            : from_storm(computation, expected, keeper(file.storms.at(computation.storm)));
    if (values.size() != expected.numbers.size())
        throw std::runtime_error(std::to_string(values.size()) + " values for " +
                                 std::to_string(expected.numbers.size()) + " printed ones");
    return values;
}

std::string miss(const Printed& printed, double ours, const std::string& what) {
    return what + ": printed " + printed.text + ", ours " +
           (std::isfinite(ours) ? shortest(ours) : "not finite") + "\n";
}

/// Every printed number that our value does not round to.
std::string misses(const std::vector<double>& ours, const ValueRow& printed,
                   const std::string& what) {
    std::string problems;
    for (std::size_t i = 0; i < ours.size(); ++i)
        if (!prints_as(ours[i], printed.numbers[i]))
            problems += miss(printed.numbers[i], ours[i], what);
    return problems;
}

/// Every printed number that our value rounds to though the mark says that it does not.
std::string false_marks(const std::vector<double>& ours, const ValueRow& printed) {
    std::string problems;
    for (std::size_t i = 0; i < ours.size(); ++i)
        if (prints_as(ours[i], printed.numbers[i]))
            problems += miss(printed.numbers[i], ours[i], "the mark is false, it reproduces");
    return problems;
}

}  // namespace

Verdict judge(const CheckFile& file, const Check& check, const BookKeeper& keeper) {
    Verdict verdict;
    try {
        verdict.ours = evaluate(file, check.computation, check.expected, keeper);
        if (check.reproduces == Reproduces::yes) {
            verdict.problems = misses(verdict.ours, check.expected, "does not reproduce");
            return verdict;
        }
        verdict.problems = false_marks(verdict.ours, check.expected) +
                           misses(verdict.ours, *check.exact, "differs from `exact`");
        if (!check.as_rounded) return verdict;
        verdict.problems += misses(evaluate(file, *check.as_rounded, check.expected, keeper),
                                   check.expected, "not even by the source's rounding");
    } catch (const std::runtime_error& error) {
        verdict.problems += std::string(error.what()) + "\n";
    }
    return verdict;
}

}  // namespace rainledger::published
