select spans.key as span, `billed`, `costed`, `expected`, count(*) as "jobs", count(missing_costs) as "wanting", sum(revenue_cents) as "revenueCents", sum(labour_cents) as "labourCents", sum(repair_labour_cents) as "repairLabourCents", sum(product_cents) as "productCents", sum(consumables_cents) as "consumablesCents", sum(bought_in_cents) as "boughtInCents", sum(fee_cents) as "feeCents", sum(exp_price_cents) as "expPriceCents", sum(exp_labour_cents) as "expLabourCents", sum(exp_repair_labour_cents) as "expRepairLabourCents", sum(exp_product_cents) as "expProductCents", sum(exp_fee_cents) as "expFeeCents"
from json_each(?) as spans
cross join (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts` on job_facts.completed_on between spans.value ->> 0 and spans.value ->> 1
where job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?))
group by spans.key, billed, costed, expected
order by spans.key, billed, costed, expected;
