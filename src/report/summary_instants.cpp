#include <algorithm>
#include <cstddef>
#include <optional>
#include <vector>

#include <fmt/core.h>

#include "report/clock.hpp"
#include "report/loss_words.hpp"
#include "report/summary_parts.hpp"
#include "report/text_table.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kMostIntervals = 12;  // of one surface; the JSON lists them all
constexpr std::size_t kIntervalsPerLine = 3;

std::string instant(const Hyetograph& rain, double elapsed_h) {
    std::string out = elapsed_text(elapsed_h);
    if (rain.stamps) out += " (" + clock_text(rain, elapsed_h) + ")";
    return out;
}

std::string instant_or_none(const Hyetograph& rain, const std::optional<double>& elapsed_h) {
    return elapsed_h ? instant(rain, *elapsed_h) : "none";
}

std::string interval_text(const Hyetograph& rain, const PondedInterval& interval) {
    const std::string start = instant(rain, interval.start_h) + " to ";
    if (!interval.end_h) return start + "the end, still ponded";
    return start + instant(rain, *interval.end_h);
}

double ponded_hours(const Hyetograph& rain, const std::vector<PondedInterval>& ponding) {
    double hours = 0.0;
    for (const PondedInterval& interval : ponding)
        hours += interval.end_h.value_or(rain.edges_h.back()) - interval.start_h;
    return hours;
}

/// The ponded intervals of a surface, a few to a line; of very many the first and a count.
std::vector<std::string> interval_lines(const Hyetograph& rain,
                                        const std::vector<PondedInterval>& ponding) {
    const std::size_t per_line = rain.stamps ? 1 : kIntervalsPerLine;
    const std::size_t shown = std::min(ponding.size(), kMostIntervals);
    std::vector<std::string> lines;
    for (std::size_t i = 0; i < shown; ++i) {
        if (i % per_line == 0)
            lines.push_back(interval_text(rain, ponding[i]));
        else
            lines.back() += "; " + interval_text(rain, ponding[i]);
    }
    if (shown < ponding.size())
        lines.push_back(fmt::format("and {} more, {} in all (--json lists them)",
                                    ponding.size() - shown,
                                    duration_text(ponded_hours(rain, ponding))));
    return lines;
}

std::string ponding_time(const StormOnSite& on, std::size_t i) {
    if (!can_pond(on.site.surfaces[i].losses)) return "-";
    const auto& ponding = on.ledger.surfaces[i].ponding;
    return ponding.empty() ? "none" : instant(on.storm.rain, ponding.front().start_h);
}

void add_surface(TextTable& table, const StormOnSite& on, std::size_t i) {
    const Hyetograph& rain = on.storm.rain;
    const SurfaceLedger& ledger = on.ledger.surfaces[i];
    std::vector<std::string> lines = interval_lines(rain, ledger.ponding);
    if (lines.empty()) lines.emplace_back(can_pond(on.site.surfaces[i].losses) ? "" : "-");
    table.row({printable(on.site.surfaces[i].name), ponding_time(on, i),
               instant_or_none(rain, ledger.runoff_start_h), lines.front()});
    for (std::size_t line = 1; line < lines.size(); ++line)
        table.row({"", "", "", lines[line]});
}

void add_joint_places(TextTable& table, const StormOnSite& on) {
    const std::vector<JointPlace> places = joint_places(on.ledger);
    for (const JointPlace& joint : places)
        table.row({places.size() == 1 ? "whole site" : joint.label,
                   instant_or_none(on.storm.rain, joint.ledger->ponding_start_h),
                   instant_or_none(on.storm.rain, joint.ledger->runoff_start_h)});
}

}  // namespace

std::string instants_part(const StormOnSite& on) {
    const Hyetograph& rain = on.storm.rain;
    TextTable table;
    table.column("surface", Align::left);
    table.column("ponding|time", Align::left);
    table.column("runoff|start", Align::left);
    table.column("ponded", Align::left);
    for (std::size_t i = 0; i < on.site.surfaces.size(); ++i)
        add_surface(table, on, i);
    const bool joins = on.site.surfaces.size() > 1;
    if (joins) {
        table.rule();
        add_joint_places(table, on);
    }
    std::string out = "When, in hours and minutes";
    if (rain.stamps)
        out += " from the start (and by the clock)";
    else if (rain.edges_h.front() != 0.0)
        out += " of the record, which begins at " + elapsed_text(rain.edges_h.front());
    else
        out += " from the start";
    out += "\n" + table.text();
    if (joins) out += "  A place ponds and runs off with the first of its surfaces.\n";
    return out;
}

}  // namespace rainledger
