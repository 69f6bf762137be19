#include "rainledger/rain/rainfall_statistics.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <string>
#include <utility>

#include "rain/log_interpolation.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

std::string years_label(double years) {
    return shortest(years) + " yr";
}

ListAnswer refused(std::string problem, std::string hint) {
    return {std::nullopt, std::move(problem), std::move(hint)};
}

std::string periods_of(const RainfallStatistics& statistics) {
    std::string out;
    for (const double years : statistics.return_period_yr)
        out += (out.empty() ? "" : ", ") + years_label(years);
    return out;
}

std::string which_to_choose(const RainfallStatistics& statistics) {
    const auto& periods = statistics.return_period_yr;
    const std::string one = "choose one of " + periods_of(statistics);
    if (periods.front() > 1.0) return one + ", or one between them";
    if (periods.size() < 3) return one;  // nothing is interpolated from a 1-year column
    return one + ", or one between " + years_label(periods[1]) + " and " +
           years_label(periods.back());
}

ListAnswer column_of(const RainfallStatistics& statistics, std::size_t column) {
    DepthList list{statistics.duration_h, {}};
    for (std::size_t i = 0; i < list.duration_h.size(); ++i)
        list.depth_mm.push_back(statistics.at(i, column));
    return {std::move(list), {}, {}};
}

ListAnswer without_period(const RainfallStatistics& statistics) {
    if (statistics.columns() == 1) return column_of(statistics, 0);
    return refused("the table holds several return periods, and none is chosen",
                   which_to_choose(statistics));
}

/// Log depth linear in the Gumbel variate between column `above` and the one before it.
ListAnswer between_columns(const RainfallStatistics& statistics, std::size_t above,
                           double return_period_yr) {
    const double from = gumbel_variate(statistics.return_period_yr[above - 1]);
    const double to = gumbel_variate(statistics.return_period_yr[above]);
    const double share = (gumbel_variate(return_period_yr) - from) / (to - from);
    DepthList list{statistics.duration_h, {}};
    double shorter_mm = 0.0;
    for (std::size_t i = 0; i < list.duration_h.size(); ++i) {
        const double depth_mm =
            between_depths(statistics.at(i, above - 1), statistics.at(i, above), share);
        shorter_mm = std::max(shorter_mm, depth_mm);  // rounding alone could let depths fall
        list.depth_mm.push_back(shorter_mm);
    }
    return {std::move(list), {}, {}};
}

ListAnswer outside(const RainfallStatistics& statistics, double return_period_yr) {
    const std::string asked = "a return period of " + years_label(return_period_yr);
    const auto& periods = statistics.return_period_yr;
    if (periods.size() == 1)
        return refused(
            asked + " is not in the table, which holds " + years_label(periods[0]) + " alone",
            "choose that one, or a table with more return periods");
    return refused(asked + " lies outside the table, which goes from " +
                       years_label(periods.front()) + " to " + years_label(periods.back()),
                   which_to_choose(statistics));
}

/// The index of the first column whose period is longer.
std::size_t column_above(const RainfallStatistics& statistics, double return_period_yr) {
    const auto& periods = statistics.return_period_yr;
    return static_cast<std::size_t>(
        std::upper_bound(periods.begin(), periods.end(), return_period_yr) - periods.begin());
}

/// The depths that the table gives a duration, by return period; empty outside its durations.
std::vector<double> depths_at(const RainfallStatistics& statistics, double duration_h) {
    std::vector<double> depths;
    for (std::size_t j = 0; j < statistics.columns(); ++j) {
        const DepthAnswer answer = depth_of(*column_of(statistics, j).list, duration_h);
        if (!answer.depth_mm) return {};
        depths.push_back(*answer.depth_mm);
    }
    return depths;
}

/// The return period of a Gumbel variate.
double period_of_variate(double variate) {
    return -1.0 / std::expm1(-std::exp(-variate));
}

/// The return period of a depth between column `above` and the one before it.
double period_between(const RainfallStatistics& statistics, const std::vector<double>& depths,
                      std::size_t above, double depth_mm) {
    const double from = gumbel_variate(statistics.return_period_yr[above - 1]);
    const double to = gumbel_variate(statistics.return_period_yr[above]);
    const double share =
        std::log(depth_mm / depths[above - 1]) / std::log(depths[above] / depths[above - 1]);
    return period_of_variate(from + share * (to - from));
}

}  // namespace

double gumbel_variate(double return_period_yr) {
    return -std::log(-std::log1p(-1.0 / return_period_yr));
}

ListAnswer depths_of(const RainfallStatistics& statistics, std::optional<double> return_period_yr) {
    if (!return_period_yr) return without_period(statistics);
    const double years = *return_period_yr;
    const auto& periods = statistics.return_period_yr;
    if (periods.empty())
        return refused("the table holds no return periods to choose from",
                       "leave the return period out");
    if (!std::isfinite(years))
        return refused("a return period must be a finite number", which_to_choose(statistics));
    for (std::size_t j = 0; j < periods.size(); ++j)
        if (is_same_coordinate(periods[j], years)) return column_of(statistics, j);
    const std::size_t above = column_above(statistics, years);
    if (!(years > 1.0) || above == 0 || above == periods.size()) return outside(statistics, years);
    if (periods[above - 1] <= 1.0)
        return refused("a return period of " + years_label(years) +
                           " lies between the table's columns for 1 yr and " +
                           years_label(periods[above]) +
                           ", and nothing is interpolated from a 1-year column",
                       "choose one of " + periods_of(statistics));
    return between_columns(statistics, above, years);
}

std::optional<Rarity> rarity_of(const RainfallStatistics& statistics, double duration_h,
                                double depth_mm) {
    const auto& periods = statistics.return_period_yr;
    if (!(depth_mm >= 0.0) || !std::isfinite(depth_mm) || periods.empty()) return std::nullopt;
    const std::vector<double> depths = depths_at(statistics, duration_h);
    if (depths.empty()) return std::nullopt;
    std::size_t above = periods.size();
    while (above > 0 && depth_mm < depths[above - 1] * (1.0 - kSameCoordinate))
        --above;
    Rarity rarity;
    if (above == 0) {
        rarity.less_than = periods[0];
    } else if (is_same_coordinate(depth_mm, depths[above - 1])) {
        rarity.years = periods[above - 1];
    } else if (above < periods.size() && periods[above - 1] > 1.0) {
        rarity.years = period_between(statistics, depths, above, depth_mm);
    } else {
        rarity.more_than = periods[above - 1];
        if (above < periods.size()) rarity.less_than = periods[above];
    }
    return rarity;
}

}  // namespace rainledger
