#include "rainledger/rain/hyetograph.hpp"

#include <algorithm>
#include <chrono>
#include <cmath>
#include <cstdlib>
#include <numeric>
#include <utility>

#include <date/date.h>

namespace rainledger {
namespace {

constexpr double kMsPerHour = 3.6e6;
constexpr double kSameEdge_h = 1e-9;  // edges nearer than this are one edge

/// Sets edges in h and durations for the given edges from `first` on. Durations are taken before
/// the conversion, so that equal steps stay equal to the last bit.
void set_given_hours(Hyetograph& rain, std::size_t first) {
    const std::vector<double>& value = rain.given->value;
    const Unit unit = find_unit(rain.given->unit, Dimension::time).value_or(Unit{});
    rain.edges_h.resize(value.size());
    rain.duration_h.resize(value.size() - 1);
    for (std::size_t i = first; i < value.size(); ++i)
        rain.edges_h[i] = unit.to_canonical(value[i]);
    for (std::size_t i = std::max<std::size_t>(first, 1); i < value.size(); ++i)
        rain.duration_h[i - 1] = unit.to_canonical(value[i] - value[i - 1]);
}

void set_stamped_hours(Hyetograph& rain, std::size_t first) {
    const std::vector<std::int64_t>& ms = rain.stamps->unix_ms;
    rain.edges_h.resize(ms.size());
    rain.duration_h.resize(ms.size() - 1);
    for (std::size_t i = first; i < ms.size(); ++i)
        rain.edges_h[i] = static_cast<double>(ms[i] - ms.front()) / kMsPerHour;
    for (std::size_t i = std::max<std::size_t>(first, 1); i < ms.size(); ++i)
        rain.duration_h[i - 1] = static_cast<double>(ms[i] - ms[i - 1]) / kMsPerHour;
}

/// Edges that extend `last` by `total` in steps of `step`, the very last one shorter where needed;
/// a remainder within `same` of a whole step is no step of its own.
std::vector<double> dry_edges(double last, double step, double total, double same) {
    const auto count = static_cast<std::size_t>(std::max(std::ceil((total - same) / step), 1.0));
    std::vector<double> edges;
    edges.reserve(count);
    for (std::size_t k = 1; k < count; ++k)
        edges.push_back(last + static_cast<double>(k) * step);
    const double whole = static_cast<double>(count) * step;
    edges.push_back(last + (std::abs(total - whole) > same ? total : whole));
    return edges;
}

void append_dry_given(Hyetograph& rain, double hours) {
    const Unit unit = find_unit(rain.given->unit, Dimension::time).value_or(Unit{});
    std::vector<double>& value = rain.given->value;
    const double step = value[rain.own_steps] - value[rain.own_steps - 1];
    const std::size_t first = value.size();
    const auto edges =
        dry_edges(value.back(), step, unit.from_canonical(hours), unit.from_canonical(kSameEdge_h));
    value.insert(value.end(), edges.begin(), edges.end());
    set_given_hours(rain, first);
}

void append_dry_stamps(Hyetograph& rain, double hours) {
    std::vector<std::int64_t>& ms = rain.stamps->unix_ms;
    const double step = rain.duration_h[rain.own_steps - 1] * kMsPerHour;
    const std::size_t first = ms.size();
    const std::int64_t last = ms.back();
    for (const double edge : dry_edges(0.0, step, hours * kMsPerHour, kSameEdge_h * kMsPerHour))
        ms.push_back(last + std::llround(edge));
    rain.stamps->offset_minutes.resize(ms.size(), rain.stamps->offset_minutes.back());
    set_stamped_hours(rain, first);
}

void append_dry_hours(Hyetograph& rain, double hours) {
    const double step = rain.duration_h[rain.own_steps - 1];
    for (const double edge_h : dry_edges(rain.edges_h.back(), step, hours, kSameEdge_h)) {
        rain.duration_h.push_back(edge_h - rain.edges_h.back());
        rain.edges_h.push_back(edge_h);
    }
}

/// Adds step `step` to `cut` in parts that end at the cuts inside it and at its own end; `next`
/// is the first cut not yet passed. The last part is what the others leave, so that the parts add
/// up to the step.
void add_parts(CutHyetograph& cut, const Hyetograph& rain, std::size_t step,
               std::span<const double> cuts_h, std::size_t& next) {
    const double whole_h = rain.duration_h[step];
    const double end_h = rain.edges_h[step + 1];
    double start_h = rain.edges_h[step];
    double left_h = whole_h;
    double left_mm = rain.depth_mm[step];
    const auto add = [&](double edge_h, double part_h, double part_mm) {
        cut.rain.edges_h.push_back(edge_h);
        cut.rain.duration_h.push_back(part_h);
        cut.rain.depth_mm.push_back(part_mm);
        cut.step_of.push_back(step);
    };
    for (; next < cuts_h.size() && cuts_h[next] < end_h; ++next) {
        const double part_h = cuts_h[next] - start_h;
        if (part_h <= kSameEdge_h || end_h - cuts_h[next] <= kSameEdge_h) continue;
        const double part_mm = rain.depth_mm[step] * part_h / whole_h;
        add(cuts_h[next], part_h, part_mm);
        left_h -= part_h;
        left_mm -= part_mm;
        start_h = cuts_h[next];
    }
    add(end_h, left_h, left_mm);
}

void append_two_digits(std::string& out, int value) {
    out.push_back(static_cast<char>('0' + value / 10));
    out.push_back(static_cast<char>('0' + value % 10));
}

void append_date(std::string& out, date::year_month_day day) {
    const std::string year = std::to_string(static_cast<int>(day.year()));
    out.append(year.size() < 4 ? 4 - year.size() : 0, '0');
    out += year;
    out.push_back('-');
    append_two_digits(out, static_cast<int>(static_cast<unsigned>(day.month())));
    out.push_back('-');
    append_two_digits(out, static_cast<int>(static_cast<unsigned>(day.day())));
}

void append_time(std::string& out, const date::hh_mm_ss<std::chrono::milliseconds>& time) {
    append_two_digits(out, static_cast<int>(time.hours().count()));
    out.push_back(':');
    append_two_digits(out, static_cast<int>(time.minutes().count()));
    out.push_back(':');
    append_two_digits(out, static_cast<int>(time.seconds().count()));
    const int ms = static_cast<int>(time.subseconds().count());
    if (ms == 0) return;
    out.push_back('.');
    out.push_back(static_cast<char>('0' + ms / 100));
    append_two_digits(out, ms % 100);
}

void append_offset(std::string& out, int minutes) {
    if (minutes == 0) {
        out.push_back('Z');
        return;
    }
    out.push_back(minutes < 0 ? '-' : '+');
    append_two_digits(out, std::abs(minutes) / 60);
    out.push_back(':');
    append_two_digits(out, std::abs(minutes) % 60);
}

}  // namespace

Hyetograph make_hyetograph(std::vector<double> edges, std::string unit,
                           std::vector<double> depth_mm) {
    Hyetograph rain;
    rain.own_steps = depth_mm.size();
    rain.depth_mm = std::move(depth_mm);
    rain.given = GivenEdges{std::move(edges), std::move(unit)};
    set_given_hours(rain, 0);
    return rain;
}

Hyetograph make_hyetograph(StampedEdges edges, std::vector<double> depth_mm) {
    Hyetograph rain;
    rain.own_steps = depth_mm.size();
    rain.depth_mm = std::move(depth_mm);
    rain.stamps = std::move(edges);
    rain.clock_assumed = !rain.stamps->has_offset;
    set_stamped_hours(rain, 0);
    return rain;
}

void multiply_depths(Hyetograph& rain, double factor) {
    for (double& depth_mm : rain.depth_mm)
        depth_mm *= factor;
}

void append_dry_time(Hyetograph& rain, double hours) {
    if (hours <= kSameEdge_h) return;
    if (rain.given)
        append_dry_given(rain, hours);
    else if (rain.stamps)
        append_dry_stamps(rain, hours);
    else
        append_dry_hours(rain, hours);
    rain.depth_mm.resize(rain.duration_h.size(), 0.0);
}

double total_depth_mm(const Hyetograph& rain) {
    const auto end = rain.depth_mm.begin() + static_cast<std::ptrdiff_t>(rain.own_steps);
    return std::accumulate(rain.depth_mm.begin(), end, 0.0);
}

double own_duration_h(const Hyetograph& rain) {
    if (!rain.given) return rain.edges_h[rain.own_steps] - rain.edges_h.front();
    const Unit unit = find_unit(rain.given->unit, Dimension::time).value_or(Unit{});
    return unit.to_canonical(rain.given->value[rain.own_steps] - rain.given->value.front());
}

double peak_intensity_mm_per_h(const Hyetograph& rain) {
    double peak = 0.0;
    for (std::size_t step = 0; step < rain.own_steps; ++step)
        peak = std::max(peak, rain.intensity_mm_per_h(step));
    return peak;
}

std::string iso_stamp(const StampedEdges& stamps, std::size_t edge) {
    const int offset = stamps.has_offset ? stamps.offset_minutes[edge] : 0;
    const std::chrono::milliseconds since_epoch(stamps.unix_ms[edge] +
                                                std::int64_t{offset} * 60'000);
    const date::sys_days midnight(date::floor<date::days>(since_epoch));
    std::string out;
    append_date(out, date::year_month_day(midnight));
    out.push_back('T');
    append_time(
        out, date::hh_mm_ss<std::chrono::milliseconds>(since_epoch - midnight.time_since_epoch()));
    if (stamps.has_offset) append_offset(out, offset);
    return out;
}

CutHyetograph cut_hyetograph(const Hyetograph& rain, std::span<const double> cuts_h) {
    CutHyetograph cut;
    const std::size_t most = rain.steps() + cuts_h.size();
    cut.rain.edges_h.reserve(most + 1);
    cut.rain.duration_h.reserve(most);
    cut.rain.depth_mm.reserve(most);
    cut.step_of.reserve(most);
    cut.rain.edges_h.push_back(rain.edges_h.front());
    std::size_t next = 0;
    for (std::size_t step = 0; step < rain.steps(); ++step) {
        add_parts(cut, rain, step, cuts_h, next);
        if (step + 1 == rain.own_steps) cut.rain.own_steps = cut.step_of.size();
    }
    return cut;
}

}  // namespace rainledger
