#include "rainledger/ledger/ledger.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <utility>
#include <variant>

#include "ledger/excess_figures.hpp"
#include "ledger/march_surface.hpp"
#include "ledger/places.hpp"
#include "ledger/recorders.hpp"

namespace rainledger {
namespace {

// How far a receiver's cumulative supply may be from the true one inside a part of run-on, over its
// own area. Accounts then stand within a few times this, also below several givers in a row.
constexpr double kRunOnTolerance = 2.0e-7;  // mm
// Beyond this the accounts below may stand further than 1e-6 mm from the true ones, which is told.
constexpr double kCoarseRunOn = 5.0e-7;  // mm

/// Surfaces in an order in which every giver comes before its receivers.
std::vector<std::size_t> givers_first(const Site& site) {
    std::vector<std::size_t> waiting(site.surfaces.size(), 0);
    for (const Surface& giver : site.surfaces)
        for (const RunsOnto& onto : giver.runs_onto)
            ++waiting[onto.surface];
    std::vector<std::size_t> order;
    for (std::size_t i = 0; i < waiting.size(); ++i)
        if (waiting[i] == 0) order.push_back(i);
    for (std::size_t done = 0; done < order.size(); ++done)
        for (const RunsOnto& onto : site.surfaces[order[done]].runs_onto)
            if (--waiting[onto.surface] == 0) order.push_back(onto.surface);
    return order;
}

/// The largest depth over a receiver that a millimetre of excess of `giver` makes; 0: no receiver.
double largest_hand_over(const Site& site, const Surface& giver) {
    double largest = 0.0;
    for (const RunsOnto& onto : giver.runs_onto)
        largest =
            std::max(largest, onto.share * giver.area_m2 / site.surfaces[onto.surface].area_m2);
    return largest;
}

/// Every surface marched once, givers before receivers.
class SiteMarch {
public:
    SiteMarch(const Site& site, const Hyetograph& rain)
        : site_(site), rain_(rain), run_on_(site.surfaces.size()) {
        out_.surfaces.resize(site.surfaces.size());
    }

    SiteLedger run(const std::vector<std::size_t>& order) {
        for (const std::size_t index : order)
            march(index);
        return std::move(out_);
    }

private:
    void march(std::size_t index) {
        const Surface& surface = site_.surfaces[index];
        const RateSeries arriving = std::move(run_on_[index]);
        const bool gives = !surface.runs_onto.empty();
        const double allowed_mm =
            gives ? kRunOnTolerance / largest_hand_over(site_, surface) : kNever;
        const MarchInput input{arriving.empty() ? nullptr : &arriving, allowed_mm};
        const ConstantRate matched = matched_phi(index, input);
        RateSeries outflow;
        LedgerRecorder recorder(rain_, gives ? &outflow : nullptr);
        march_surface(surface, matched, rain_, input, recorder);
        if (recorder.coarsest_mm() > 0.0) note_coarse(recorder.coarsest_mm() / allowed_mm);
        SurfaceLedger& ledger = out_.surfaces[index] = recorder.finish();
        if (std::holds_alternative<PhiIndex>(surface.losses))
            ledger.phi_index_mm_per_h = matched.rate_mm_per_h;
        for (const RunsOnto& onto : surface.runs_onto)
            add_scaled(run_on_[onto.surface], outflow,
                       onto.share * surface.area_m2 / site_.surfaces[onto.surface].area_m2);
    }

    void note_coarse(double times_allowed) {
        const double difference = times_allowed * kRunOnTolerance;
        if (difference <= kCoarseRunOn) return;
        if (!out_.coarse_run_on || out_.coarse_run_on->difference_mm < difference)
            out_.coarse_run_on = CoarseRunOn{difference};
    }

    ConstantRate matched_phi(std::size_t index, const MarchInput& input) {
        const Surface& surface = site_.surfaces[index];
        const auto* phi = std::get_if<PhiIndex>(&surface.losses);
        if (phi == nullptr) return {};
        const PhiMatch match = match_phi_index(*phi, surface, rain_, input);
        if (const auto* rate = std::get_if<ConstantRate>(&match)) return *rate;
        out_.unmatched.push_back(std::get<UnmatchedPhi>(match));
        out_.unmatched.back().surface = index;
        return {};
    }

    const Site& site_;
    const Hyetograph& rain_;
    std::vector<RateSeries> run_on_;
    SiteLedger out_;
};

/// Rows of the finer steps added up to reporting steps.
std::vector<LedgerRow> reported_rows(const std::vector<LedgerRow>& fine,
                                     const std::vector<double>& fine_edges_h,
                                     const std::vector<double>& edges_h) {
    std::vector<LedgerRow> out(edges_h.size() - 1);
    std::size_t row = 0;
    for (std::size_t step = 0; step < fine.size(); ++step) {
        const double middle = 0.5 * (fine_edges_h[step] + fine_edges_h[step + 1]);
        while (row + 1 < out.size() && middle > edges_h[row + 1])
            ++row;
        add_step(out[row].accounts, fine[step].accounts);
        out[row].capacity_mm_per_h = fine[step].capacity_mm_per_h;
    }
    return out;
}

}  // namespace

SiteLedger keep_ledger(const Site& site, const Hyetograph& rain) {
    SiteLedger ledger = SiteMarch(site, rain).run(givers_first(site));
    for (std::size_t i = 0; i < site.surfaces.size(); ++i) {
        SurfaceLedger& surface = ledger.surfaces[i];
        surface.figures =
            excess_figures(surface.rows, surface.total, site.surfaces[i].area_m2, rain);
    }
    ledger.places = place_ledgers(site, ledger.surfaces, rain);
    ledger.site = site_ledger(site, ledger.surfaces, rain);
    return ledger;
}

ReportedLedger report_every(const Site& site, const Hyetograph& rain, double every_h,
                            SiteLedger marched) {
    ReportedLedger out;
    out.ledger = std::move(marched);
    const double start = rain.edges_h.front();
    const double end = rain.edges_h.back();
    // A report edge within a rounding of the end is the end.
    constexpr double kEdgeTolerance = 1.0e-9;
    const auto count = static_cast<std::size_t>(
        std::max(1.0, std::ceil((end - start - kEdgeTolerance) / every_h)));
    for (std::size_t k = 0; k < count; ++k)
        out.edges_h.push_back(start + static_cast<double>(k) * every_h);
    out.edges_h.push_back(end);

    const CutHyetograph cut = cut_hyetograph(rain, out.edges_h);
    const SiteLedger fine = keep_ledger(site, cut.rain);
    const auto report = [&](std::vector<LedgerRow>& rows, const std::vector<LedgerRow>& finer) {
        rows = reported_rows(finer, cut.rain.edges_h, out.edges_h);
    };
    for (std::size_t i = 0; i < fine.surfaces.size(); ++i)
        report(out.ledger.surfaces[i].rows, fine.surfaces[i].rows);
    for (std::size_t i = 0; i < fine.places.size(); ++i)
        report(out.ledger.places[i].rows, fine.places[i].rows);
    report(out.ledger.site.rows, fine.site.rows);
    return out;
}

Accounts march_totals(const Surface& surface, const Hyetograph& rain) {
    ConstantRate matched;
    if (const auto* phi = std::get_if<PhiIndex>(&surface.losses)) {
        const PhiMatch match = match_phi_index(*phi, surface, rain, {});
        if (const auto* rate = std::get_if<ConstantRate>(&match)) matched = *rate;
    }
    TotalsRecorder recorder;
    march_surface(surface, matched, rain, {}, recorder);
    return recorder.total();
}

}  // namespace rainledger
