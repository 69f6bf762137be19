#pragma once

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <limits>
#include <optional>
#include <utility>
#include <vector>

#include "ledger/run_on.hpp"
#include "rainledger/ledger/ledger.hpp"
#include "rainledger/rain/hyetograph.hpp"

// What listens to a march: the full ledger, and totals only.
namespace rainledger {

/// A sum that carries its rounding errors along (Neumaier 1974), so that a total over 10^5 steps is
/// as good as one over ten.
class CarefulSum {
public:
    void add(double value) {
        const double sum = sum_ + value;
        lost_ += std::abs(sum_) >= std::abs(value) ? (sum_ - sum) + value : (value - sum) + sum_;
        sum_ = sum;
    }
    [[nodiscard]] double value() const { return sum_ + lost_; }

private:
    double sum_ = 0.0;
    double lost_ = 0.0;
};

/// Running totals of the accounts.
class AccountTotals {
public:
    void add(const Accounts& step) {
        rain_.add(step.rain_mm);
        run_on_.add(step.run_on_mm);
        initial_loss_.add(step.initial_loss_mm);
        infiltrated_.add(step.infiltrated_mm);
        excess_.add(step.excess_mm);
        ponded_mm_ = step.ponded_mm;
    }
    [[nodiscard]] Accounts total() const {
        return {rain_.value(),        run_on_.value(), initial_loss_.value(),
                infiltrated_.value(), ponded_mm_,      excess_.value()};
    }

private:
    CarefulSum rain_;
    CarefulSum run_on_;
    CarefulSum initial_loss_;
    CarefulSum infiltrated_;
    CarefulSum excess_;
    double ponded_mm_ = 0.0;
};

/// Adds a step's accounts to a plain sum.
inline void add_step(Accounts& sum, const Accounts& step) {
    sum.rain_mm += step.rain_mm;
    sum.run_on_mm += step.run_on_mm;
    sum.initial_loss_mm += step.initial_loss_mm;
    sum.infiltrated_mm += step.infiltrated_mm;
    sum.ponded_mm = step.ponded_mm;
    sum.excess_mm += step.excess_mm;
}

/// By how much the books of a step, or of a whole storm, do not balance: left less right.
inline double imbalance_mm(const Accounts& accounts, double ponded_before_mm) {
    return accounts.rain_mm + accounts.run_on_mm -
           (accounts.initial_loss_mm + accounts.infiltrated_mm +
            (accounts.ponded_mm - ponded_before_mm) + accounts.excess_mm);
}

/// The larger of two errors; one that is no number counts as largest.
inline double larger_error(double one, double other) {
    if (std::isnan(one) || std::isnan(other)) return std::numeric_limits<double>::quiet_NaN();
    return std::max(one, other);
}

/// Keeps the whole ledger of a surface, and its outflow where a receiver wants it.
class LedgerRecorder {
public:
    LedgerRecorder(const Hyetograph& rain, RateSeries* outflow) : rain_(rain), outflow_(outflow) {
        ledger_.rows.reserve(rain.steps());
    }

    void step_begins(std::size_t step) { step_ = step; }

    void ponding_starts(double h) {
        // A pond that ends and starts at one instant has not ended.
        if (!ledger_.ponding.empty() && ledger_.ponding.back().end_h == instant_h(h)) {
            ledger_.ponding.back().end_h.reset();
        } else {
            ledger_.ponding.push_back({instant_h(h), std::nullopt});
        }
    }
    void ponding_ends(double h) {
        PondedInterval& interval = ledger_.ponding.back();
        interval.end_h = instant_h(h);
        if (*interval.end_h <= interval.start_h) ledger_.ponding.pop_back();
    }
    void runoff_starts(double h) { ledger_.runoff_start_h = instant_h(h); }
    void coarse(double difference_mm) { coarsest_mm_ = std::max(coarsest_mm_, difference_mm); }

    void outflow(double end_h, double rate) {
        if (outflow_ != nullptr) outflow_->add(end_h, rate);
    }

    template <class Capacity>
    void step_ends(std::size_t step, const Accounts& accounts, const Capacity& capacity) {
        ledger_.closure_mm =
            larger_error(ledger_.closure_mm, std::abs(imbalance_mm(accounts, ponded_before_mm_)));
        ponded_before_mm_ = accounts.ponded_mm;
        totals_.add(accounts);
        ledger_.rows.push_back({accounts, capacity()});
        if (outflow_ != nullptr) outflow_->end_step(rain_.duration_h[step]);
    }

    /// The largest difference of a part of varying excess that was left longer than allowed; 0:
    /// none.
    [[nodiscard]] double coarsest_mm() const { return coarsest_mm_; }

    [[nodiscard]] SurfaceLedger finish() {
        ledger_.total = totals_.total();
        ledger_.closure_mm =
            larger_error(ledger_.closure_mm, std::abs(imbalance_mm(ledger_.total, 0.0)));
        return std::move(ledger_);
    }

private:
    /// Elapsed time at `h` from the step's start; the step's end is the next one's start to the
    /// last bit.
    [[nodiscard]] double instant_h(double h) const {
        if (h >= rain_.duration_h[step_]) return rain_.edges_h[step_ + 1];
        return std::min(rain_.edges_h[step_] + h, rain_.edges_h[step_ + 1]);
    }

    const Hyetograph& rain_;
    RateSeries* outflow_;
    SurfaceLedger ledger_;
    AccountTotals totals_;
    std::size_t step_ = 0;
    double ponded_before_mm_ = 0.0;
    double coarsest_mm_ = 0.0;
};

/// Keeps totals and nothing else; plain sums, for speed.
class TotalsRecorder {
public:
    void step_begins(std::size_t /*step*/) {}
    void ponding_starts(double /*h*/) {}
    void ponding_ends(double /*h*/) {}
    void runoff_starts(double /*h*/) {}
    void coarse(double /*difference_mm*/) {}
    void outflow(double /*end_h*/, double /*rate*/) {}
    template <class Capacity>
    void step_ends(std::size_t /*step*/, const Accounts& accounts, const Capacity& /*capacity*/) {
        add_step(total_, accounts);
    }
    [[nodiscard]] Accounts total() const { return total_; }

private:
    Accounts total_;
};

}  // namespace rainledger
