#include "ledger/places.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <optional>

#include "ledger/excess_figures.hpp"
#include "ledger/recorders.hpp"

namespace rainledger {
namespace {

/// A surface's part in an area: accounts scaled by its share of the area, excess by what reaches
/// the place, and the excess sent to surfaces outside the area.
struct Member {
    std::size_t surface = 0;
    double weight = 0.0;        // area over the place's area
    double reaches = 1.0;       // share of the excess that reaches the place
    double sent_outside = 0.0;  // share of the excess that runs onto surfaces outside
};

/// Run-on that a member receives from one outside surface, as a factor on the giver's excess.
struct Arrival {
    std::size_t giver = 0;
    double factor = 0.0;  // share * giver's area over the place's area
};

struct Membership {
    double area_m2 = 0.0;
    std::vector<Member> members;
    std::vector<Arrival> arrivals;
};

template <class Inside>
Membership membership(const Site& site, const Inside& inside) {
    Membership out;
    for (const Surface& surface : site.surfaces)
        if (inside(surface)) out.area_m2 += surface.area_m2;
    for (std::size_t i = 0; i < site.surfaces.size(); ++i) {
        const Surface& surface = site.surfaces[i];
        Member member{i, surface.area_m2 / out.area_m2, 1.0, 0.0};
        for (const RunsOnto& onto : surface.runs_onto) {
            member.reaches -= onto.share;
            const bool to_inside = inside(site.surfaces[onto.surface]);
            if (inside(surface) && !to_inside) member.sent_outside += onto.share;
            if (!inside(surface) && to_inside)
                out.arrivals.push_back({i, onto.share * member.weight});
        }
        // Shares such as 0.3 + 0.3 + 0.4 sum to one but for the last bit.
        if (std::abs(member.reaches) < kRateTolerance) member.reaches = 0.0;
        if (inside(surface)) out.members.push_back(member);
    }
    return out;
}

Accounts combined(const Membership& of, const std::vector<SurfaceLedger>& surfaces,
                  std::size_t step) {
    Accounts sum;
    for (const Member& member : of.members) {
        const Accounts& own = surfaces[member.surface].rows[step].accounts;
        sum.rain_mm += member.weight * own.rain_mm;
        sum.initial_loss_mm += member.weight * own.initial_loss_mm;
        sum.infiltrated_mm += member.weight * own.infiltrated_mm;
        sum.ponded_mm += member.weight * own.ponded_mm;
        sum.excess_mm += member.weight * member.reaches * own.excess_mm;
        sum.run_on_mm -= member.weight * member.sent_outside * own.excess_mm;
    }
    for (const Arrival& arrival : of.arrivals)
        sum.run_on_mm += arrival.factor * surfaces[arrival.giver].rows[step].accounts.excess_mm;
    return sum;
}

/// The earlier of two instants that may not exist.
std::optional<double> earlier(std::optional<double> one, std::optional<double> other) {
    if (!one || !other) return one ? one : other;
    return std::min(*one, *other);
}

void add_starts(PlaceLedger& place, const Membership& of,
                const std::vector<SurfaceLedger>& surfaces) {
    for (const Member& member : of.members) {
        const SurfaceLedger& surface = surfaces[member.surface];
        if (!surface.ponding.empty())
            place.ponding_start_h = earlier(place.ponding_start_h, surface.ponding.front().start_h);
        if (member.reaches > 0.0)
            place.runoff_start_h = earlier(place.runoff_start_h, surface.runoff_start_h);
    }
}

PlaceLedger ledger_of(const Membership& of, const std::vector<SurfaceLedger>& surfaces,
                      const Hyetograph& rain) {
    PlaceLedger out;
    out.area_m2 = of.area_m2;
    out.rows.reserve(rain.steps());
    AccountTotals totals;
    double ponded_before = 0.0;
    for (std::size_t step = 0; step < rain.steps(); ++step) {
        const Accounts sum = combined(of, surfaces, step);
        out.closure_mm = larger_error(out.closure_mm, std::abs(imbalance_mm(sum, ponded_before)));
        ponded_before = sum.ponded_mm;
        totals.add(sum);
        out.rows.push_back({sum});
    }
    out.total = totals.total();
    out.closure_mm = larger_error(out.closure_mm, std::abs(imbalance_mm(out.total, 0.0)));
    out.figures = excess_figures(out.rows, out.total, out.area_m2, rain);
    add_starts(out, of, surfaces);
    return out;
}

}  // namespace

std::vector<PlaceLedger> place_ledgers(const Site& site, const std::vector<SurfaceLedger>& surfaces,
                                       const Hyetograph& rain) {
    std::vector<PlaceLedger> out;
    for (const Surface& first : site.surfaces) {
        const std::string& name = first.drains_to;
        if (std::ranges::any_of(out, [&](const PlaceLedger& known) { return known.name == name; }))
            continue;
        const auto inside = [&](const Surface& surface) { return surface.drains_to == name; };
        out.push_back(ledger_of(membership(site, inside), surfaces, rain));
        out.back().name = name;
    }
    return out;
}

PlaceLedger site_ledger(const Site& site, const std::vector<SurfaceLedger>& surfaces,
                        const Hyetograph& rain) {
    return ledger_of(membership(site, [](const Surface&) { return true; }), surfaces, rain);
}

}  // namespace rainledger
