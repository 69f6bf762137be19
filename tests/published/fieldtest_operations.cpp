#include "published/fieldtest_operations.hpp"

#include <array>
#include <cmath>
#include <stdexcept>
#include <string>
#include <vector>

#include "rainledger/fieldtest/horton_line.hpp"
#include "rainledger/fieldtest/law_fits.hpp"
#include "rainledger/fieldtest/least_squares.hpp"
#include "rainledger/fieldtest/readings.hpp"
#include "rainledger/fieldtest/steady_rate.hpp"

namespace rainledger::published {
namespace {

using enum Dimension;

// --- Horton's straight line through rates. ---

HortonCurve horton_line(Inputs& in, std::size_t i) {
    const auto times = in.series("times", time);
    const auto values = in.series("rates", rate);
    std::vector<TimedRate> rates;
    for (std::size_t j = 0; j < times.size(); ++j)
        rates.push_back({times[j], values.at(j)});
    const auto answer = fit_horton_line(rates, in.quantity("final_capacity", rate, i));
    if (!answer.line) throw std::runtime_error(answer.problem);
    return answer.line->curve;
}

double line_initial(Inputs& in, std::size_t i) {
    return horton_line(in, i).initial_capacity_mm_per_h;
}

double line_decay(Inputs& in, std::size_t i) {
    return horton_line(in, i).decay_per_h;
}

// --- Laws through cumulative depths. ---

/// Depths less what infiltrates at once, where a source adds such a term to its law.
InfiltrationTest read_depths(Inputs& in) {
    const double at_once_mm = in.has("at_once") ? in.quantity("at_once", depth, 0) : 0.0;
    const auto times = in.series("times", time);
    const auto depths = in.series("depths", depth);
    std::vector<ReadingRow> rows;
    for (std::size_t j = 0; j < times.size(); ++j)
        rows.push_back({"", times[j], depths.at(j) - at_once_mm, false});
    const auto reduced = reduce_readings(rows, ReadingKind::infiltrated, {});
    if (!reduced.problems.empty()) throw std::runtime_error(reduced.problems.front().message);
    return reduced.tests.front();
}

double fitted(Inputs& in, FieldLaw law, std::size_t parameter) {
    const InfiltrationTest test = read_depths(in);
    const auto answer = fit_law({&test, 1}, law);
    if (!answer.fit) throw std::runtime_error(answer.problem);
    return answer.fit->parameters[parameter].value;
}

double fit_initial(Inputs& in, std::size_t /*i*/) {
    return fitted(in, FieldLaw::horton, 0);
}

double fit_final(Inputs& in, std::size_t /*i*/) {
    return fitted(in, FieldLaw::horton, 1);
}

double fit_decay(Inputs& in, std::size_t /*i*/) {
    return fitted(in, FieldLaw::horton, 2);
}

double fit_exponent(Inputs& in, std::size_t /*i*/) {
    return fitted(in, FieldLaw::kostiakov, 1);
}

/// k of Horton's curve with given f0 and fc through one depth, by least squares.
double decay_through_depth(Inputs& in, std::size_t i) {
    const double f0 = in.quantity("initial_capacity", rate, i);
    const double fc = in.quantity("final_capacity", rate, i);
    const double t = in.quantity("time", time, i);
    LeastSquaresProblem problem;
    problem.observed = {in.quantity("depth", depth, i)};
    problem.ranges = {{0.0}};
    problem.starts = {{1.0 / t}, {100.0 / t}};
    problem.model = [=](std::span<const double> p, std::span<double> values) {
        values[0] = horton_cumulative({f0, fc, p[0]}, t);
    };
    problem.slopes = [=](std::span<const double> p, std::span<double> slopes) {
        const double x = p[0] * t;
        slopes[0] = (f0 - fc) * (std::exp(-x) * (1.0 + x) - 1.0) / (p[0] * p[0]);
    };
    const auto answer = fit_least_squares(problem);
    if (!answer.fit) throw std::runtime_error(answer.problem);
    return answer.fit->parameters[0];
}

// --- Rings and steady rates. ---

Rings rings_of(Inputs& in, std::size_t i) {
    Rings rings{in.quantity("inner_diameter", depth, i)};
    if (in.has("outer_diameter")) rings.outer_diameter_mm = in.quantity("outer_diameter", depth, i);
    return rings;
}

double inner_ring_area(Inputs& in, std::size_t i) {
    return inner_area_m2(rings_of(in, i));
}

double annulus_area(Inputs& in, std::size_t i) {
    return annulus_area_m2(rings_of(in, i));
}

double ring_depth(Inputs& in, std::size_t i) {
    const ReadingRow row{"", 1.0, in.quantity("volume", volume, i), false};
    const auto reduced = reduce_readings({&row, 1}, ReadingKind::volume_added, rings_of(in, i));
    if (!reduced.problems.empty()) throw std::runtime_error(reduced.problems.front().message);
    return reduced.tests.front().readings.front().depth_mm;
}

double steady_time(Inputs& in, std::size_t i) {
    return kostiakov_steady_time_h(in.number("exponent", i));
}

constexpr std::array kOperations{
    Operation{"horton_line_initial", rate, line_initial},
    Operation{"horton_line_decay", decay, line_decay},
    Operation{"horton_fit_initial", rate, fit_initial},
    Operation{"horton_fit_final", rate, fit_final},
    Operation{"horton_fit_decay", decay, fit_decay},
    Operation{"horton_decay_through_depth", decay, decay_through_depth},
    Operation{"kostiakov_fit_exponent", {}, fit_exponent},
    Operation{"inner_ring_area", area, inner_ring_area},
    Operation{"annulus_area", area, annulus_area},
    Operation{"ring_depth", depth, ring_depth},
    Operation{"kostiakov_steady_time", time, steady_time},
};

}  // namespace

std::span<const Operation> fieldtest_operations() {
    return kOperations;
}

}  // namespace rainledger::published
