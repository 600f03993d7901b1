select count(*) as cars, sum(has_rot) as "withRot", sum(bubbles_worked) as "bubblesWorked", sum(bubbles_holed) as "bubblesHoled", sum(bought_in_sent_cents) as "boughtIn", json_group_array(act_minutes) as list0, json_group_array(act_strip) as list1, json_group_array(act_clean) as list2, json_group_array(act_dry) as list3, json_group_array(act_repair) as list4, json_group_array(act_mask) as list5, json_group_array(act_apply) as list6, json_group_array(act_refit) as list7
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where `job_facts`.`package_id` = ? and `job_facts`.`completed_on` > ? and `job_facts`.`completed_on` <= ? and `act_minutes` > ? and `age_band` = ? and `model_key` = ?;

select `products`.`code` as `product`, sum(`job_products`.`ml`) as `ml`
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
cross join (select * from job_products where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_products` on job_products.branch_id = job_facts.branch_id and job_products.job_id = job_facts.job_id and job_products.completed_on = job_facts.completed_on
inner join `products` on `products`.`id` = `job_products`.`product_id`
where `job_facts`.`package_id` = ? and `job_facts`.`completed_on` > ? and `job_facts`.`completed_on` <= ? and `act_minutes` > ? and `age_band` = ? and `model_key` = ?
group by `products`.`code`
having sum(job_products.ml) > 0
order by `products`.`code` asc;

select `kind`, coalesce(sum(quantity * unit_cost_cents), 0) as "ownCents", coalesce(sum(quantity) filter (where unit_cost_cents is null), 0) as quantity
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
cross join (select * from job_consumables where branch_id in (select value from json_each(?))) as `job_consumables` on job_consumables.job_id = job_facts.job_id
where `job_facts`.`package_id` = ? and `job_facts`.`completed_on` > ? and `job_facts`.`completed_on` <= ? and `act_minutes` > ? and `age_band` = ? and `model_key` = ?
group by `kind`
order by `kind` asc;
